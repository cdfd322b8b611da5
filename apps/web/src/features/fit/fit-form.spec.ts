import { gapOf } from './fit-form.js';

describe('a measured gap as it is typed', () => {
  it.each([
    ['', null],
    ['  ', null],
    ['-0.2', -0.2],
    ['−0.2', -0.2],
    ['0,15', 0.15],
  ])('“%s” is %j', (typed, gap) => expect(gapOf(typed)).toBe(gap));
  it('is refused where it is no number', () => expect(gapOf('tight')).toBeNaN());
});
