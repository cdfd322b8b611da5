import { money } from '@windchest/money';
import type { PledgeMessage } from '../pledge-message.js';

const amount = money(900, 'EUR');
const pledge = { name: 'Wren', plan: 'High water', pledgeLink: 'https://saltmarsh.example/account/pledge' };
const receipt = {
  amount,
  receiptNumber: '2026-000393',
  tax: [{ rateLabel: 'VAT 19 %', amount: money(144, 'EUR') }],
};
const supportLink = 'https://saltmarsh.example/support';
const settleLink = 'https://pay.example/invoice/8r2mQk7w';

/** The mails about pledges, and the forms of them that differ most. */
export const samplePledges: readonly { title: string; message: PledgeMessage }[] = [
  {
    title: 'Pledge begun',
    message: {
      template: 'pledge-began',
      ...pledge,
      ...receipt,
      kits: ['Curlew', 'Dunlin', 'Godwit', 'Reed Bunting', 'Teal'],
      nextPaymentAt: '2027-01-12T09:00:00Z',
      shelfLink: 'https://saltmarsh.example/shelf',
    },
  },
  {
    title: 'Pledge, a later month',
    message: {
      template: 'pledge-receipt',
      ...pledge,
      ...receipt,
      periodStart: '2027-01-12T09:00:00Z',
      periodEnd: '2027-02-12T09:00:00Z',
    },
  },
  {
    title: 'Pledge, payment failed',
    message: {
      template: 'pledge-payment-failed',
      ...pledge,
      amount,
      graceUntil: '2027-02-19T09:00:00Z',
      settleLink,
    },
  },
  {
    title: 'Pledge, grace days nearly over, without a page to pay on',
    message: { template: 'pledge-grace-ends-soon', ...pledge, amount, graceUntil: '2027-02-19T09:00:00Z' },
  },
  {
    title: 'Pledge lapsed',
    message: { template: 'pledge-lapsed', ...pledge, keeps: 'released-during', supportLink },
  },
  {
    title: 'Pledge will end',
    message: {
      template: 'pledge-will-end',
      ...pledge,
      endsAt: '2027-02-12T09:00:00Z',
      keeps: 'released-before-end',
    },
  },
  {
    title: 'Pledge ended',
    message: { template: 'pledge-ended', ...pledge, keeps: 'nothing', supportLink },
  },
  {
    title: 'Pledge paused',
    message: {
      template: 'pledge-paused',
      ...pledge,
      amount,
      restsFrom: '2027-02-12T09:00:00Z',
      nextPaymentAt: '2027-04-12T09:00:00Z',
      keeps: 'released-during',
    },
  },
  {
    title: 'Pledge goes on soon',
    message: { template: 'pledge-resumes-soon', ...pledge, amount, nextPaymentAt: '2027-04-12T09:00:00Z' },
  },
  {
    title: 'Pledge, another plan',
    message: {
      template: 'pledge-plan-changes',
      ...pledge,
      plan: 'Tide table',
      nextPlan: 'High water',
      amount,
      from: '2027-01-12T09:00:00Z',
    },
  },
];
