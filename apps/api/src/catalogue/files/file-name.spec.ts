import { Refusal } from '../../http/refusal.js';
import { safeFileName } from './file-name.js';
import { nextFreeCode, partFromName } from './part-from-name.js';

describe('file names', () => {
  it('are kept as given, in composed form', () => {
    expect(safeFileName(' J-01 Locking tongue.stl ')).toBe('J-01 Locking tongue.stl');
    expect(safeFileName('Pfeife U\u0308bung (2).3mf')).toBe('Pfeife Übung (2).3mf');
    expect(safeFileName('50% – 日本.stl')).toBe('50% – 日本.stl');
    expect(safeFileName('console.stl')).toBe('console.stl');
  });

  it.each([
    ['', /without a name/],
    ['../x.stl', /climbs out/],
    ['a/../../x.stl', /climbs out/],
    ['..', /climbs out/],
    ['a/b.stl', /carries a path/],
    ['a\\b.stl', /carries a path/],
    ['\\\\server\\x.stl', /absolute path/],
    ['c:x.stl', /absolute path/],
    ['a\u0000.stl', /control character/],
    ['a\u0085.stl', /control character/],
    ['a\u202egpj.stl', /reading direction/],
    ['a\u2066b.stl', /reading direction/],
    ['a\u200b.stl', /invisible/],
    ['a?.stl', /not every disk/],
    ['com1.txt', /device/],
    ['AUX', /device/],
    ['.htaccess', /begins with/],
    ['-rf.stl', /begins with/],
    ['a.', /ends in a dot/],
    ['a\ud800.stl', /broken characters/],
    ['a'.repeat(151), /Shorten/],
  ])('such as %j are refused with a sentence that names the fault', (name, sentence) => {
    expect(() => safeFileName(name)).toThrow(Refusal);
    expect(() => safeFileName(name)).toThrow(sentence);
  });

  it('are shown in sentences without their hidden signs', () => {
    expect(() => safeFileName('a\u202eb\u0007.stl')).toThrow('“a\\u202eb\\u0007.stl”');
  });
});

describe('the part that a file name stands for', () => {
  it.each([
    ['J-01 Locking tongue.stl', 'J-01', 'Locking tongue'],
    ['P-72_pipe.3mf', 'P-72', 'Pipe'],
    ['h-3a-foot_left.STL', 'H-3a', 'Foot left'],
    ['ABC-123.stl', 'ABC-123', 'ABC-123'],
    ['mouth_piece v2.stl', null, 'Mouth piece v2'],
    ['ABCD-1 x.stl', null, 'ABCD-1 x'],
    ['J-01tongue.stl', null, 'J-01tongue'],
    ['J-01- tongue (2).stl', 'J-01', 'Tongue (2)'],
    ['Tongue (plus).stl', null, 'Tongue (plus)'],
  ])('of %s', (fileName, code, name) => {
    expect(partFromName(fileName)).toEqual({ code, name, clearance: 'zero' });
  });

  it.each([
    ['J-01 Locking tongue (plus).stl', 'plus', 'Locking tongue'],
    ['J-01-locking-tongue-(minus).3mf', 'minus', 'Locking-tongue'],
    ['j-01(PLUS).stl', 'plus', 'J-01'],
    ['J-01 (-) Locking tongue.stl', 'minus', 'Locking tongue'],
    ['J-01 (−) Locking tongue.stl', 'minus', 'Locking tongue'],
    ['J-01_(+)_Locking tongue.stl', 'plus', 'Locking tongue'],
    ['J-01 Locking tongue (zero).stl', 'zero', 'Locking tongue'],
  ])('and the clearance of it, of %s', (fileName, clearance, name) => {
    expect(partFromName(fileName)).toEqual({ code: 'J-01', name, clearance });
  });

  it('gets the lowest free code where the name has none', () => {
    expect(nextFreeCode([])).toBe('P-01');
    expect(nextFreeCode(['P-01', 'J-02', 'P-03'])).toBe('P-02');
  });
});
