import { changesOf, pathWords } from './log-changes.js';

describe('changesOf', () => {
  it('tells only what differs, down to single fields', () => {
    expect(
      changesOf(
        { cap: 150, room: { temperatureC: 20, a4Hz: 440 }, kitIds: ['a'] },
        { cap: 100, room: { temperatureC: 21, a4Hz: 440 }, kitIds: ['a', 'b'] },
      ),
    ).toEqual([
      { path: 'cap', before: 150, after: 100 },
      { path: 'room.temperatureC', before: 20, after: 21 },
      { path: 'kitIds', before: ['a'], after: ['a', 'b'] },
    ]);
  });

  it('shows every value of what was made or thrown away', () => {
    expect(changesOf(null, { code: 'WINDFALL' })).toEqual([
      { path: 'code', before: undefined, after: 'WINDFALL' },
    ]);
    expect(changesOf({ code: 'WINDFALL' }, undefined)).toEqual([
      { path: 'code', before: 'WINDFALL', after: undefined },
    ]);
  });

  it('has nothing to tell where nothing was written down', () => {
    expect(changesOf(null, undefined)).toEqual([]);
  });

  it('takes a plain value as one change', () => {
    expect(changesOf('a', { b: 1 })).toEqual([{ path: '', before: 'a', after: { b: 1 } }]);
  });
});

describe('pathWords', () => {
  it('turns a field into words', () => {
    expect(pathWords('room.temperatureC')).toBe('room, temperature c');
    expect(pathWords('declaredCents')).toBe('declared cents');
  });
});
