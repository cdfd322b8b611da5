import { expect } from '@playwright/test';

export interface CaughtMail {
  id: string;
  subject: string;
  text: string;
  html: string;
  to: { address: string }[];
  time: string;
}

const mailUrl = process.env['WINDCHEST_MAIL_URL'] ?? '';

export const mailsTo = async (address: string): Promise<CaughtMail[]> => {
  const response = await fetch(`${mailUrl}/api/email`);
  const mails = (await response.json()) as CaughtMail[];
  return mails.filter((mail) => mail.to.some((one) => one.address === address));
};

/** Waits for a mail to an address whose subject matches, and gives the newest. */
export const awaitMail = async (address: string, subject: RegExp): Promise<CaughtMail> => {
  let found: CaughtMail | undefined;
  await expect
    .poll(
      async () => {
        found = (await mailsTo(address)).filter((mail) => subject.test(mail.subject)).at(-1);
        return found?.subject ?? '';
      },
      { timeout: 30_000, message: `a mail to ${address} about ${subject}` },
    )
    .toMatch(subject);
  return found as CaughtMail;
};

/** The first address in a mail's text that leads to this path of the shop. */
export const linkIn = (mail: CaughtMail, path: string): string => {
  const found = new RegExp(`https?://[^\\s]+${path}[^\\s]*`).exec(mail.text)?.[0];
  if (!found) throw new Error(`The mail “${mail.subject}” has no link to ${path}.`);
  return found;
};
