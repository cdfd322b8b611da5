import type { Page } from '@playwright/test';

export interface DemoSignIn {
  role: string;
  email: string;
  passphrase: string;
}

const { demoSignIns } = (await import('../../seed-data/dist/sign-ins.js')) as { demoSignIns: DemoSignIn[] };

export const demoPerson = (role: string): DemoSignIn => {
  const found = demoSignIns.find((one) => one.role === role);
  if (!found) throw new Error(`The demo has nobody in the role ${role}.`);
  return found;
};

/** Signs in through the page, as a person does. */
export const signIn = async (
  page: Page,
  { email, passphrase }: Pick<DemoSignIn, 'email' | 'passphrase'>,
): Promise<void> => {
  await page.goto('/sign-in');
  await page.getByLabel('E-mail').fill(email);
  await page.getByLabel('Passphrase', { exact: true }).fill(passphrase);
  await page.getByRole('button', { name: 'Sign in' }).click();
  await page.waitForURL((url) => !url.pathname.startsWith('/sign-in'));
};
