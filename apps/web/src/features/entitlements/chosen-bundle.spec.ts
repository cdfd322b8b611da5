import type { ShelfKit } from '@windchest/contracts';
import { chosenBundle } from './chosen-bundle.js';

const sha256 = 'a'.repeat(64);
const revision = (...clearances: ('minus' | 'zero' | 'plus')[]): ShelfKit['newest'] => ({
  id: 'r',
  label: 'Mk 1.1',
  releasedAt: '2026-01-01T00:00:00Z',
  bundleBytes: 300,
  bundleSha256: sha256,
  bundles: clearances.map((clearance, at) => ({ clearance, bytes: 100 + at, sha256 })),
  changeNotes: '',
  isWithdrawn: false,
  withdrawnReason: null,
});
const kit = (chosen: ShelfKit['clearance']['chosen']) => ({
  slug: 'curlew',
  clearance: { hasVariants: true, gauge: null, chosen, said: chosen, habit: null },
});

describe('the bundle a person fetches', () => {
  it('is that of the clearance they print', () => {
    expect(chosenBundle(kit('plus'), revision('minus', 'zero', 'plus'))).toEqual({
      wish: { kitSlug: 'curlew', revisionId: 'r', clearance: 'plus' },
      bytes: 102,
      clearance: 'plus',
    });
  });

  it('is the whole one while nothing is chosen, and where the revision does not come in that clearance', () => {
    const whole = { wish: { kitSlug: 'curlew', revisionId: 'r' }, bytes: 300, clearance: null };
    expect(chosenBundle(kit(null), revision('minus', 'zero', 'plus'))).toEqual(whole);
    expect(chosenBundle(kit('plus'), revision())).toEqual(whole);
  });
});
