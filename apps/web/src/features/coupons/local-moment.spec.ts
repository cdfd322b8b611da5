import { fromLocalField, toLocalField } from './local-moment.js';

describe('moments in a form', () => {
  it('come back to the minute they were, whatever the zone', () => {
    for (const moment of ['2026-01-01T00:00:00.000Z', '2026-07-15T21:45:00.000Z'])
      expect(fromLocalField(toLocalField(moment))).toBe(moment);
  });

  it('are none where nothing stands in the field', () => {
    expect(toLocalField(null)).toBe('');
    expect(fromLocalField('')).toBeNull();
    expect(fromLocalField('31 November')).toBeNull();
  });
});
