import { planBody, type WorkshopPlan } from '@windchest/contracts';
import { planBodyOf, planForm } from './plan-form.js';

const kit = '01900000-0000-7000-8000-000000000001';
const plan: WorkshopPlan = {
  id: '01900000-0000-7000-8000-000000000002',
  name: 'High water',
  words: 'All of it.',
  amount: { minor: 900, currency: 'EUR' },
  hasAllKits: false,
  kits: [{ id: kit, name: 'Curlew' }],
  keepsAfter: 'nothing',
  isOffered: true,
  supporters: 2,
  monthly: { minor: 1800, currency: 'EUR' },
  areShelvesUpToDate: true,
  createdAt: '2026-11-12T12:00:00.000Z',
  updatedAt: '2026-11-12T12:00:00.000Z',
};

describe('the form of a plan', () => {
  it('sends what it was filled with', () => {
    expect(planBody.parse(planBodyOf('EUR')(planForm(plan)))).toEqual({
      name: 'High water',
      words: 'All of it.',
      amountMinor: 900,
      hasAllKits: false,
      kitIds: [kit],
      keepsAfter: 'nothing',
      isOffered: true,
    });
  });

  it('sends no list of kits where all are included', () => {
    const body = planBodyOf('EUR')({ ...planForm(plan), scope: 'all' });
    expect(body).toMatchObject({ hasAllKits: true, kitIds: [] });
  });

  it('is refused without an amount that can be read, and without kits', () => {
    const check = (changes: object) =>
      planBody.safeParse(planBodyOf('EUR')({ ...planForm(plan), ...changes })).success;
    expect(check({ amountMinor: 'nine' })).toBe(false);
    expect(check({ amountMinor: '9.005' })).toBe(false);
    expect(check({ kitIds: [] })).toBe(false);
    expect(check({ amountMinor: '12' })).toBe(true);
  });
});
