import { mkdtemp, readdir, readFile, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { expect, test } from '@playwright/test';
import { expectAccessible } from './support/axe.js';
import { demoPerson, signIn } from './support/demo.js';
import { watchHosts } from './support/own-host.js';

interface SeedData {
  demoWorkshop: { kits: { slug: string; revisions: { label: string }[] }[] };
  generateFiles: (kit: unknown, revision: unknown) => { fileName: string; bytes: Uint8Array }[];
}

/** A binary STL moved and stretched a little upwards: the same part, taller. */
const taller = (stl: Buffer, byMm: number): Buffer => {
  const copy = Buffer.from(stl);
  const count = copy.readUInt32LE(80);
  let top = -Infinity;
  const heights: number[] = [];
  for (let triangle = 0; triangle < count; triangle++)
    for (let corner = 0; corner < 3; corner++) {
      const at = 84 + triangle * 50 + 12 + corner * 12 + 8;
      heights.push(at);
      top = Math.max(top, copy.readFloatLE(at));
    }
  for (const at of heights) if (copy.readFloatLE(at) > top - 0.001) copy.writeFloatLE(top + byMm, at);
  return copy;
};

test('a maker uploads a new revision, sees every part measured and compared, and releases it', async ({
  page,
}) => {
  test.setTimeout(180_000);
  const hosts = watchHosts(page);
  const folder = await mkdtemp(join(tmpdir(), 'windchest-journey-'));
  const { demoWorkshop, generateFiles } = (await import('../seed-data/dist/index.js')) as unknown as SeedData;
  const teal = demoWorkshop.kits.find((kit) => kit.slug === 'teal');
  for (const { fileName, bytes } of generateFiles(teal, teal?.revisions.at(-1)))
    await writeFile(join(folder, fileName), bytes);
  const files = (await readdir(folder)).sort();
  const changed = files.find((name) => name.endsWith('.stl')) ?? '';
  await writeFile(join(folder, changed), taller(await readFile(join(folder, changed)), 1.5));
  const code = changed.split('-').slice(0, 2).join('-');
  await writeFile(join(folder, 'Z-01 broken.stl'), (await readFile(join(folder, changed))).subarray(0, 900));

  await test.step('starts the next issue of the kit', async () => {
    await signIn(page, demoPerson('maker'));
    await page.goto('/workshop/kits');
    await page.getByRole('link', { name: 'Teal' }).first().click();
    await expect(page.getByRole('heading', { level: 1, name: 'Teal' })).toBeVisible();
    await expectAccessible(page, 'workshop kit');
    await page.getByRole('button', { name: 'Start Mk 1.1 (issue)' }).click();
    await expect(page.getByRole('heading', { level: 1, name: /Mk 1\.1/ })).toBeVisible();
  });

  await test.step('drops the files; what is stored is not sent again, the broken one says why', async () => {
    await page
      .locator('input[type=file]')
      .setInputFiles([...files, 'Z-01 broken.stl'].map((name) => join(folder, name)));
    await expect(page.getByText(/Finished, not everything arrived|Sent/).first()).toBeVisible({
      timeout: 60_000,
    });
    await expect(page.getByText(/Compared with Mk 1\.0: 1 changed/)).toBeVisible({ timeout: 60_000 });
    await expect(page.getByText(/Z-01 broken\.stl.*(bytes|cut|triangles)/i).first()).toBeVisible();
  });

  await test.step('takes the broken part out again', async () => {
    await page.getByRole('button', { name: 'Edit Z-01' }).click();
    await page.getByRole('button', { name: 'Drop this part' }).click();
    await page
      .getByRole('alertdialog')
      .or(page.getByRole('dialog'))
      .last()
      .getByRole('button', { name: /Drop/ })
      .last()
      .click();
    await expect(page.getByRole('button', { name: 'Edit Z-01' })).toHaveCount(0);
  });

  await test.step('sees what differs, and says what buyers should do', async () => {
    const row = page.getByRole('row').filter({ hasText: code });
    await expect(row).toContainText('changed');
    await expect(row).toContainText('+1.50 mm');
    await expect(row).toContainText('up to 1.50 mm, at the top');
    await expect(row).toContainText('watertight');
    await row.getByRole('combobox').selectOption({ label: 'reprint needed' });
    const reason = row.getByRole('textbox');
    await reason.fill('The short bar rattled on its felt');
    await reason.blur();
    await expectAccessible(page, 'revision parts');
  });

  await test.step('writes change notes with the usual headings', async () => {
    await page.getByRole('link', { name: 'Change notes' }).click();
    await expect(page.getByRole('img', { name: new RegExp(`${code}.*Marked is where`) })).toBeVisible();
    const notes = page.getByRole('textbox', { name: 'Change notes' });
    await notes.fill(`## Changed\n\n- [[${code}]] is 1.5 mm thicker: the old one rattled on its felt.\n`);
    await page.getByRole('button', { name: 'Save the change notes' }).click();
    await expect(page.getByText('Saved.').first()).toBeVisible();
    await expectAccessible(page, 'revision change notes');
    await page.getByRole('link', { name: 'Assembly notes' }).click();
    await expect(page.getByRole('textbox', { name: 'Assembly notes' })).not.toBeEmpty();
    await page.getByRole('link', { name: 'Print specification' }).click();
    await expect(page.getByLabel('Nozzle')).toBeVisible();
    await expectAccessible(page, 'revision specification');
  });

  await test.step('is kept from releasing while a gate is open', async () => {
    const open = page.getByRole('button', { name: /Release Mk 1\.1 — .* open/ });
    if (await open.count()) {
      await expect(open).toBeDisabled();
      // The thicker bar sounds higher than its note; the maker declares a wider range.
      await page.getByLabel('Declared cents').fill('400');
      await page.getByRole('button', { name: 'Save the specification' }).click();
      await expect(page.getByText('Saved.').first()).toBeVisible();
    }
  });

  await test.step('releases it', async () => {
    await page.getByRole('button', { name: 'Release Mk 1.1', exact: true }).click();
    const ask = page.getByRole('alertdialog').or(page.getByRole('dialog')).last();
    await expect(ask).toContainText('cannot be changed after that');
    await ask.getByRole('button', { name: /Release/ }).click();
    await expect(page.getByText(/Mk 1\.1 was released on/).first()).toBeVisible({ timeout: 60_000 });
    await page.goto('/kits/teal');
    await expect(page.getByText('Mk 1.1').first()).toBeVisible();
  });

  await test.step('its holder reads on the shelf what to reprint', async () => {
    await page.goto('/account');
    await page.getByRole('button', { name: 'Sign out' }).first().click();
    const { demoSignIns } = await import('../seed-data/dist/sign-ins.js');
    await signIn(
      page,
      demoSignIns.find((one) => one.email.startsWith('jonas')) ?? { email: '', passphrase: '' },
    );
    await page.goto('/shelf');
    await expectAccessible(page, 'shelf');
    await page.goto('/shelf/teal');
    await expect(page.getByText(/reprint 1 of \d+ parts/).first()).toBeVisible();
    await expect(page.getByText('The short bar rattled on its felt').first()).toBeVisible();
    await expectAccessible(page, 'shelf kit');
  });

  hosts.check();
  await rm(folder, { recursive: true, force: true });
});
