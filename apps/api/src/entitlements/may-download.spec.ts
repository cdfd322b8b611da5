import { mayDownload, type DownloadClaim } from './may-download.js';

const claim = (changes: Partial<DownloadClaim> = {}): DownloadClaim => ({
  kitId: 'curlew',
  revision: { kitId: 'curlew', isReleased: true, isWithdrawn: false },
  entitlements: [{ id: 'mine', kitId: 'curlew', state: 'active' }],
  ...changes,
});

describe('whether a person may download a file', () => {
  it('is yes with an active entitlement to the kit and a released revision', () => {
    expect(mayDownload(claim())).toEqual({ isAllowed: true, entitlementId: 'mine' });
  });

  it('is no without an entitlement, or with one to another kit', () => {
    expect(mayDownload(claim({ entitlements: [] }))).toEqual({ isAllowed: false, why: 'not-entitled' });
    expect(mayDownload(claim({ entitlements: [{ id: 'x', kitId: 'teal', state: 'active' }] }))).toMatchObject(
      { why: 'not-entitled' },
    );
  });

  it('is no when the revision belongs to another kit than the one named', () => {
    expect(
      mayDownload(claim({ revision: { kitId: 'teal', isReleased: true, isWithdrawn: false } })),
    ).toMatchObject({ why: 'not-entitled' });
  });

  it('is no while suspended and after the end, unless another entitlement holds', () => {
    const suspended = { id: 'a', kitId: 'curlew', state: 'suspended' } as const;
    const ended = { id: 'b', kitId: 'curlew', state: 'ended' } as const;
    expect(mayDownload(claim({ entitlements: [ended] }))).toMatchObject({ why: 'ended' });
    expect(mayDownload(claim({ entitlements: [ended, suspended] }))).toMatchObject({ why: 'suspended' });
    expect(
      mayDownload(claim({ entitlements: [ended, suspended, { id: 'c', kitId: 'curlew', state: 'active' }] })),
    ).toEqual({ isAllowed: true, entitlementId: 'c' });
  });

  it('is no for a draft and for a withdrawn revision', () => {
    expect(
      mayDownload(claim({ revision: { kitId: 'curlew', isReleased: false, isWithdrawn: false } })),
    ).toMatchObject({ why: 'not-released' });
    expect(
      mayDownload(claim({ revision: { kitId: 'curlew', isReleased: true, isWithdrawn: true } })),
    ).toMatchObject({ why: 'withdrawn' });
  });
});
