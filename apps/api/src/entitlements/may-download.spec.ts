import { mayDownload, type DownloadClaim } from './may-download.js';

const day = (text: string) => new Date(`2026-${text}T12:00:00.000Z`);
type Entitlement = DownloadClaim['entitlements'][number];
const entitlement = (changes: Partial<Entitlement> = {}): Entitlement => ({
  id: 'mine',
  kitId: 'curlew',
  source: 'purchase',
  state: 'active',
  releasedFrom: null,
  releasedBefore: null,
  ...changes,
});
const revision = (changes: Partial<DownloadClaim['revision']> = {}): DownloadClaim['revision'] => ({
  kitId: 'curlew',
  releasedAt: day('05-01'),
  isReleased: true,
  isWithdrawn: false,
  ...changes,
});
const claim = (changes: Partial<DownloadClaim> = {}): DownloadClaim => ({
  kitId: 'curlew',
  revision: revision(),
  entitlements: [entitlement()],
  ...changes,
});

describe('whether a person may download a file', () => {
  it('is yes with an active entitlement to the kit and a released revision', () => {
    expect(mayDownload(claim())).toEqual({ isAllowed: true, entitlementId: 'mine' });
  });

  it('is no without an entitlement, or with one to another kit', () => {
    expect(mayDownload(claim({ entitlements: [] }))).toEqual({ isAllowed: false, why: 'not-entitled' });
    expect(mayDownload(claim({ entitlements: [entitlement({ kitId: 'teal' })] }))).toMatchObject({
      why: 'not-entitled',
    });
  });

  it('is no when the revision belongs to another kit than the one named', () => {
    expect(mayDownload(claim({ revision: revision({ kitId: 'teal' }) }))).toMatchObject({
      why: 'not-entitled',
    });
  });

  it('is no while suspended and after the end, unless another entitlement holds', () => {
    const suspended = entitlement({ id: 'a', state: 'suspended' });
    const ended = entitlement({ id: 'b', state: 'ended' });
    expect(mayDownload(claim({ entitlements: [ended] }))).toMatchObject({ why: 'ended' });
    expect(mayDownload(claim({ entitlements: [ended, suspended] }))).toMatchObject({ why: 'suspended' });
    expect(mayDownload(claim({ entitlements: [ended, suspended, entitlement({ id: 'c' })] }))).toEqual({
      isAllowed: true,
      entitlementId: 'c',
    });
  });

  it('is no for a draft and for a withdrawn revision', () => {
    expect(mayDownload(claim({ revision: revision({ isReleased: false, releasedAt: null }) }))).toMatchObject(
      { why: 'not-released' },
    );
    expect(mayDownload(claim({ revision: revision({ isWithdrawn: true }) }))).toMatchObject({
      why: 'withdrawn',
    });
  });
});

describe('what a pledge lets a person download', () => {
  const pledge = entitlement({ id: 'pledge', source: 'pledge' });
  const kept = { ...pledge, releasedFrom: day('04-01'), releasedBefore: day('06-01') };
  const by = (one: Entitlement, releasedAt: Date) =>
    mayDownload(claim({ revision: revision({ releasedAt }), entitlements: [one] }));

  it('is every revision while it is paid, old ones and new ones', () => {
    expect(by(pledge, day('01-01'))).toMatchObject({ isAllowed: true });
    expect(by(pledge, day('12-01'))).toMatchObject({ isAllowed: true });
  });

  it('is after its end exactly what was released in its time: from its first moment, up to but not its last', () => {
    expect(by(kept, day('03-31'))).toEqual({ isAllowed: false, why: 'outside-pledge' });
    expect(by(kept, day('04-01'))).toMatchObject({ isAllowed: true });
    expect(by(kept, day('05-31'))).toMatchObject({ isAllowed: true });
    expect(by(kept, day('06-01'))).toEqual({ isAllowed: false, why: 'outside-pledge' });
  });

  it('is all that was released until its end where the plan says so', () => {
    const untilEnd = { ...kept, releasedFrom: null };
    expect(by(untilEnd, day('01-01'))).toMatchObject({ isAllowed: true });
    expect(by(untilEnd, day('06-01'))).toMatchObject({ isAllowed: false });
  });

  it('rests with the pledge and ends with it, each with its own reason', () => {
    expect(by({ ...pledge, state: 'suspended' }, day('05-01'))).toMatchObject({ why: 'pledge-rests' });
    expect(by({ ...pledge, state: 'ended' }, day('05-01'))).toMatchObject({ why: 'pledge-ended' });
  });

  it('leaves what was bought alone', () => {
    const both = [{ ...kept, id: 'kept' }, entitlement({ id: 'bought' })];
    expect(
      mayDownload(claim({ revision: revision({ releasedAt: day('12-01') }), entitlements: both })),
    ).toEqual({ isAllowed: true, entitlementId: 'bought' });
    const ended = [{ ...pledge, state: 'ended' as const }, entitlement({ id: 'bought' })];
    expect(mayDownload(claim({ entitlements: ended }))).toEqual({ isAllowed: true, entitlementId: 'bought' });
  });
});
