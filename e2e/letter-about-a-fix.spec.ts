import { expect, test } from '@playwright/test';
import { expectAccessible } from './support/axe.js';
import { demoPerson, signIn } from './support/demo.js';
import { watchHosts } from './support/own-host.js';
import { awaitMail, mailsTo } from './support/mailbox.js';
import { draftSmallKit, releaseBoxes, takeAsGuest } from './support/small-kit.js';

test('a maker writes to the buyers concerned about a fix; each letter names its reader’s own parts', async ({
  page,
}) => {
  test.setTimeout(150_000);
  const hosts = watchHosts(page);
  const run = Date.now();
  const address = (name: string): string => `${name}.${run}@mail.example`;
  const fixed = {
    j: { code: 'J-01', heightMm: 41, because: 'The old tongue jams in PETG' },
    r: { code: 'R-01', heightMm: 13, because: 'The old rail whistles' },
    b: { code: 'B-01', heightMm: 9, because: 'The old bar rattles' },
  };
  const kit = await draftSmallKit(demoPerson('maker'), `Whimbrel ${run % 10_000}`);
  const later = ({ code, heightMm }: { code: string; heightMm: number }) => ({ code, heightMm });

  await test.step('four buyers hold four revisions, each mending one part more', async () => {
    const [j, r, b] = [
      { code: 'J-01', heightMm: 40 },
      { code: 'R-01', heightMm: 12 },
      { code: 'B-01', heightMm: 8 },
    ];
    await releaseBoxes(kit, [j, r, b]);
    await takeAsGuest(kit, address('first'));
    await releaseBoxes(kit, [fixed.j, r, b]);
    await takeAsGuest(kit, address('second'));
    await releaseBoxes(kit, [later(fixed.j), fixed.r, b]);
    await takeAsGuest(kit, address('third'));
    await releaseBoxes(kit, [later(fixed.j), later(fixed.r), fixed.b]);
    await takeAsGuest(kit, address('fourth'));
  });

  await test.step('writes the letter, sees whom it reaches and who is left out and why', async () => {
    await signIn(page, demoPerson('maker'));
    await page.goto('/workshop/letters');
    await page.getByRole('link', { name: 'Write a letter' }).first().click();
    await page.getByLabel('About the kit').selectOption({ label: kit.name });
    await page.getByLabel('Subject').fill('{kit}: what {newest} mends');
    const letter = page.getByRole('textbox', { name: 'Letter' });
    await letter.fill('Hello {name},\n\nyou hold {held}. Print these again:\n\n');
    await letter.press('Control+End');
    await page.getByRole('button', { name: 'reprint list' }).click();
    await page.getByRole('button', { name: 'link to the files' }).click();
    await expect(letter).toHaveValue(/\{reprint_list\}\s+\{download_link\}/);
    await expect(page.getByText('3 readers get it')).toBeVisible();
    await expect(page.getByText('1: they hold this revision already, or a newer one')).toBeVisible();
    await page.getByLabel('Show').selectOption({ label: 'Left out' });
    await expect(page.getByRole('row').filter({ hasText: address('fourth') })).toContainText(
      'hold this revision',
    );
    await page.getByRole('button', { name: 'Save the draft' }).click();
    await expect(page.getByRole('button', { name: 'Send …' })).toBeVisible();
  });

  await test.step('looks at it as one reader gets it, and sends it', async () => {
    await page
      .getByRole('row')
      .filter({ hasText: address('second') })
      .getByRole('button', { name: 'See theirs' })
      .click();
    const frame = page.frameLocator('iframe[title="The letter as HTML"]');
    await expect(frame.getByText('R-01')).toBeVisible();
    await expect(frame.getByText('J-01')).toHaveCount(0);
    // The frame lets no script run, and so not the checker's either.
    await page.getByRole('button', { name: 'As text' }).click();
    await expectAccessible(page, 'letter draft');
    await page.getByRole('button', { name: 'Send …' }).click();
    await page.getByRole('dialog').last().getByRole('button', { name: 'Send it now' }).click();
    await expect(page.getByText(/^Sent, finished on/)).toBeVisible({ timeout: 30_000 });
    await expect(page.getByText('1: they hold this revision already, or a newer one')).toBeVisible();
    await expect(page.getByRole('row').filter({ hasText: address('first') })).toContainText('sent');
    await expectAccessible(page, 'letter sent');
  });

  await test.step('each got exactly their own list, and the one who needs nothing got none', async () => {
    const subject = `${kit.name}: what Mk 1.3 mends`;
    for (const [name, held, codes] of [
      ['first', 'Mk 1.0', ['B-01', 'J-01', 'R-01']],
      ['second', 'Mk 1.1', ['B-01', 'R-01']],
      ['third', 'Mk 1.2', ['B-01']],
    ] as const) {
      const mail = await awaitMail(address(name), /mends/);
      expect(mail.subject).toBe(subject);
      for (const form of [mail.text, mail.html])
        expect([...new Set(form.match(/\b[A-Z]-0\d\b/g))].sort()).toEqual(codes);
      expect(mail.text).toContain(`you hold ${held}.`);
      expect((await mailsTo(address(name))).filter((one) => one.subject === subject)).toHaveLength(1);
    }
    expect((await mailsTo(address('fourth'))).filter((one) => one.subject === subject)).toEqual([]);
  });

  hosts.check();
});
