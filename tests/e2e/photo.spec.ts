/** A photo at the bench: taken without a network, kept, sent before its entry, and seen in the record. */
import sharp from 'sharp';

import { BenchPage } from './BenchPage';
import { expect, test } from './fixtures';
import { addPhotoTree, photoTree } from './photoTree';
import { addRestMachine } from './restMachine';
import { signIn } from './signIn';

test('a photo is taken with no network, sent when it is back, and shown in the record without what a camera tells', async ({ stack, openDevice }) => {
  await addPhotoTree(stack.ownerUrl);
  const machine = await addRestMachine(stack.ownerUrl, 'T-0101');
  const page = await openDevice();
  await page.clock.install();
  await signIn(page, 'restorer');
  const bench = new BenchPage(page);
  await bench.start(machine, photoTree.title);
  await bench.playUntil((seen) => seen.title === 'The connectors as found');
  await bench.allSaved();

  const sideways = await sharp({ create: { width: 3600, height: 1800, channels: 3, background: '#7a4a20' } })
    .withMetadata({ orientation: 6 })
    .withExifMerge({ IFD0: { ImageDescription: 'told by the camera' }, IFD3: { GPSLatitudeRef: 'N', GPSLatitude: '51/1 30/1 0/1' } })
    .jpeg()
    .toBuffer();
  const choose = async (button: string, photo: { name: string; mimeType: string; buffer: Buffer }) => {
    const opened = page.waitForEvent('filechooser');
    await page.getByRole('button', { name: button }).click();
    await (await opened).setFiles(photo);
  };
  await choose('Choose a picture', { name: 'note.jpg', mimeType: 'image/jpeg', buffer: Buffer.from('no picture') });
  await expect(page.getByRole('status').filter({ hasText: 'cannot be read' })).toBeVisible();

  await page.context().setOffline(true);
  await choose('Take the photo', { name: 'IMG_1.jpg', mimeType: 'image/jpeg', buffer: sideways });
  await expect(page.getByRole('img', { name: 'The photo that you took' })).toBeVisible();
  await page.getByRole('button', { name: 'Keep this photo' }).click();
  await expect(page.getByRole('heading', { level: 1, name: 'The connectors as found' })).toBeHidden();
  await page.context().setOffline(false);
  await bench.allSaved();
  await bench.answer('Close the record');
  await expect(page.getByRole('link', { name: 'To the record' })).toBeVisible();
  await bench.allSaved();

  await page.goto(`/records/${bench.run}`);
  const shown = page.getByRole('img', { name: /^Photo of entry/ });
  await expect(shown).toBeVisible();
  const whole = page.getByRole('link', { name: /^Open the photo of entry .* whole$/ });
  const answer = await page.request.get(String(await whole.getAttribute('href')));
  expect(answer.status()).toBe(200);
  const kept = await answer.body();
  const { width, height, exif } = await sharp(kept).metadata();
  expect([width, height, exif]).toEqual([1200, 2400, undefined]);
  expect(kept.includes('told by the camera')).toBe(false);
});
