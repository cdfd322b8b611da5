import { bodyOf, emptyLetter } from './letter-form.js';

describe('a letter as it is sent to the API', () => {
  it('asks nothing about a kit where there is none', () => {
    const form = emptyLetter(300);
    const body = bodyOf({ ...form, audience: { ...form.audience, reportedParts: ['H-03'] } });
    expect([body.audience.ownsKit, body.audience.reportedParts]).toEqual([false, []]);
  });

  it('is left as it is with a kit', () => {
    const form = { ...emptyLetter(300), kitId: '00000000-0000-7000-8000-000000000000' };
    expect(bodyOf(form)).toBe(form);
  });
});
