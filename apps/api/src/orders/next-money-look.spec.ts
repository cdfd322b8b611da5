import { nextMoneyLook } from './next-money-look.js';

const paidAt = new Date('2026-03-01T12:00:00Z');
const after = (seconds: number) => new Date(paidAt.getTime() + seconds * 1000);

describe('looking again whether money went back', () => {
  it('comes within the hour, then ever more rarely, then weekly', () => {
    expect(nextMoneyLook(paidAt, paidAt)).toBe(3600);
    expect(nextMoneyLook(paidAt, after(4 * 3600))).toBe(2 * 3600);
    expect(nextMoneyLook(paidAt, after(30 * 86_400))).toBe(7 * 86_400);
  });

  it('ends after half a year, within fifty looks', () => {
    let looks = 0;
    let age = 0;
    for (let seconds = nextMoneyLook(paidAt, paidAt); seconds !== null; looks += 1) {
      age += seconds;
      seconds = nextMoneyLook(paidAt, after(age));
    }
    expect(looks).toBeLessThan(50);
    expect(age).toBeGreaterThan(180 * 86_400);
  });
});
