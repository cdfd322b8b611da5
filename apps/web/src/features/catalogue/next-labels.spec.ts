import { nextLabels } from './next-labels.js';

describe('nextLabels', () => {
  it('counts on from the highest revision, not from the first in the list', () => {
    expect(nextLabels(['Mk 1.9', 'Mk 1.10', 'Mk 1.2'])).toEqual({ issue: 'Mk 1.11', mark: 'Mk 2.0' });
    expect(nextLabels(['Mk 1.4', 'Mk 2.0'])).toEqual({ issue: 'Mk 2.1', mark: 'Mk 3.0' });
  });

  it('starts at Mk 1.0', () => {
    expect(nextLabels([])).toEqual({ issue: 'Mk 1.0', mark: 'Mk 1.0' });
  });
});
