import path from 'node:path';
import { expect, team, test } from './support/people';

/** The picture that README shows: `README_PICTURE=yes` renews it, any other run proves that it can be made. */
test('the picture of the README is made', async ({ as }, info) => {
  const page = await as('member');
  const demo = page.getByRole('link', { name: /^Demo/ }).first();
  // the demo team's recordings are still being drawn when a run begins
  await expect(async () => {
    await page.goto(`${team}/find?q=ring+row&kit=any`);
    await expect(demo).toBeVisible({ timeout: 4000 });
  }).toPass({ timeout: 100_000 });
  await demo.click();
  await expect(page.getByRole('heading', { level: 1, name: 'Ring row' })).toBeVisible();
  const video = page.locator('video');
  await expect.poll(() => video.evaluate((one: HTMLVideoElement) => one.readyState)).toBeGreaterThan(2);
  await page.waitForTimeout(6000);
  const file = process.env.README_PICTURE ? path.resolve('docs/watch.png') : info.outputPath('watch.png');
  await page.screenshot({ path: file });
});
