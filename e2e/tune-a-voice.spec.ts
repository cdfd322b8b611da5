import { expect, test } from '@playwright/test';
import { expectAccessible } from './support/axe.js';
import { demoPerson, signIn } from './support/demo.js';
import { watchHosts } from './support/own-host.js';

const SAMPLE_RATE = 44_100;

/** A stopped pipe as a recording: its fundamental and twelfth, one second, 16 bit. */
const pipeRecording = (hz: number): Buffer => {
  const wav = Buffer.alloc(44 + 2 * SAMPLE_RATE);
  wav.write('RIFF', 0);
  wav.writeUInt32LE(wav.length - 8, 4);
  wav.write('WAVEfmt ', 8);
  wav.writeUInt32LE(16, 16);
  wav.writeUInt16LE(1, 20);
  wav.writeUInt16LE(1, 22);
  wav.writeUInt32LE(SAMPLE_RATE, 24);
  wav.writeUInt32LE(2 * SAMPLE_RATE, 28);
  wav.writeUInt16LE(2, 32);
  wav.writeUInt16LE(16, 34);
  wav.write('data', 36);
  wav.writeUInt32LE(2 * SAMPLE_RATE, 40);
  for (let at = 0; at < SAMPLE_RATE; at++) {
    const turn = (2 * Math.PI * hz * at) / SAMPLE_RATE;
    wav.writeInt16LE(Math.round(8000 * (Math.sin(turn) + 0.2 * Math.sin(3 * turn))), 44 + 2 * at);
  }
  return wav;
};

/** C5 of A4 = 440 Hz (ISO 16, twelve equal steps to the octave). */
const C5_HZ = 440 * 2 ** (3 / 12);

test('a buyer plays a recording of a flat pipe to the tuner and reads what to trim', async ({ page }) => {
  const hosts = watchHosts(page);
  await signIn(page, demoPerson('buyer'));
  await page.goto('/shelf/curlew');
  await page.getByRole('link', { name: 'Tune what you printed' }).click();
  await expect(page.getByRole('heading', { level: 1, name: 'Tune Curlew' })).toBeVisible();
  await expect(page.getByLabel('Voice', { exact: true })).toHaveValue('P-72');

  const recording = (cents: number) => ({
    name: 'pipe.wav',
    mimeType: 'audio/wav',
    buffer: pipeRecording(C5_HZ * 2 ** (cents / 1200)),
  });
  await page.locator('input[type=file]').setInputFiles(recording(-20));
  await expect(page.getByRole('heading', { name: '20 cents flat' })).toBeVisible();
  await expect(page.getByText(/^Trim 1\.9 mm off the open end\.$/).first()).toBeVisible();
  await expectAccessible(page, 'tuner');

  // The same sound is no pitch of the next pipe but one, and the tuner knows whose it is.
  await page.getByLabel('Voice', { exact: true }).selectOption({ label: 'D5, P-74' });
  await page.getByRole('button', { name: 'Choose C5' }).click();
  await expect(page.getByLabel('Voice', { exact: true })).toHaveValue('P-72');

  await page.locator('input[type=file]').setInputFiles({ ...recording(0), buffer: Buffer.from('no sound') });
  await expect(page.getByText('“pipe.wav” is no sound this browser knows.')).toBeVisible();
  hosts.check();
});

test('a visitor opens a part to turn it, and is told its size and that it is not the file', async ({
  page,
}) => {
  await page.goto('/kits/curlew');
  await page.getByRole('button', { name: /^B-01/ }).click();
  const dialog = page.getByRole('dialog', { name: 'B-01 Pipe block, low' });
  await expect(
    dialog.getByText('105.6 mm wide, 39 mm deep, 30 mm tall, as it goes on the bed.'),
  ).toBeVisible();
  await expect(dialog.getByText(/not the file/)).toBeVisible();
  // Browsers without WebGL show the drawing and say so.
  const view = dialog.getByRole('application');
  await expect(view.or(dialog.getByText(/does not draw in three dimensions/)).first()).toBeVisible();
  if (await view.isVisible()) {
    await view.press('ArrowLeft');
    await expect(dialog.getByRole('status')).toHaveText('Seen from 47° around, 24° above');
  }
  await page.keyboard.press('Escape');
  await expect(dialog).toHaveCount(0);
});
