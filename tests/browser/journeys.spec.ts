import { execFileSync } from 'node:child_process';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { expect, type Page } from '@playwright/test';
import { complaintsOf, isInOrder, picture } from './support/looks';
import { team, test } from './support/people';

/**
 * The whole path with a real file: a coach uploads, marks and publishes; an editor brings captions, corrects a line and
 * pins a cue; a member types the movement with a typo and watches that second. On a desktop and on a phone.
 */

const plans = {
  desktop: { session: 'Floor and door', movement: 'Heron step', typo: 'herron stp' },
  phone: { session: 'Quiet jumps', movement: 'Otter roll', typo: 'oter rol' },
} as const;

const seconds = 12;
let folder: string;
let clip: string;

test.describe.configure({ mode: 'serial' });

test.beforeAll(() => {
  folder = mkdtempSync(path.join(tmpdir(), 'tapeline-journey-'));
  clip = path.join(folder, 'evening-take.mp4');
  // a counter of seconds in the picture, a tone in the sound
  execFileSync('ffmpeg', [
    ...['-v', 'error', '-nostdin', '-y'],
    ...['-f', 'lavfi', '-i', `testsrc=size=640x360:rate=30:duration=${seconds}`],
    ...['-f', 'lavfi', '-i', `sine=frequency=440:duration=${seconds}`],
    ...['-c:v', 'libx264', '-preset', 'ultrafast', '-pix_fmt', 'yuv420p', '-g', '60', '-c:a', 'aac', clip],
  ]);
});
test.afterAll(() => rmSync(folder, { recursive: true, force: true }));

const planOf = (project: string) => plans[project as keyof typeof plans];

/** The recording's own page at the desk, by way of the footage list. */
async function openFootage(page: Page, session: string, what: 'Mark' | 'Words') {
  await page.goto(`${team}/footage`);
  const row = page.getByRole('listitem').filter({ hasText: 'evening take' }).filter({ hasText: session });
  await row.getByRole('link', { name: new RegExp(`^${what}`) }).click();
  await expect(page).toHaveURL(what === 'Mark' ? /\/footage\/./ : /\/words\/./);
  await expect(page.getByRole('group', { name: 'Player' })).toBeVisible();
}

const saved = (page: Page, words = 'Saved') => expect(page.getByText(words, { exact: true })).toBeVisible();

test('the coach uploads a file and sees it become playable', async ({ as }, { project }) => {
  const { session } = planOf(project.name);
  const page = await as('coach');
  const complaints = complaintsOf(page);
  await page.goto(`${team}/footage`);
  const choice = page.getByLabel('New files go to');
  const option = choice.locator('option').filter({ hasText: session });
  await expect(option).toBeAttached();
  await choice.selectOption((await option.getAttribute('value')) ?? '');
  await page.locator('input[type=file]').first().setInputFiles(clip);
  const row = page.getByRole('listitem').filter({ hasText: 'evening take' }).filter({ hasText: session });
  await expect(row.getByRole('link', { name: /^Mark/ })).toBeVisible({ timeout: 60_000 });
  await expect(row.getByRole('link', { name: /^Watch/ })).toBeVisible({ timeout: 90_000 });
  await picture(page, `journey-uploaded-${project.name}`);
  await isInOrder(page);
  expect(complaints).toEqual([]);
});

test('the coach marks a demo of a new movement and a substitution, undoes a slip, and publishes', async ({ as }, {
  project,
}) => {
  const { session, movement } = planOf(project.name);
  const page = await as('coach');
  await openFootage(page, session, 'Mark');
  const play = page.getByRole('group', { name: 'Player' }).getByRole('button', { name: /^Play/ });
  await expect(play).toBeEnabled();
  const forward = page.getByRole('button', { name: 'On 1 second' });
  await forward.click();
  await forward.click();
  await page.getByRole('button', { name: /^Start here/ }).click();
  const chapter = page.getByRole('group', { name: /^Edit / });
  await chapter.getByText('Demo', { exact: true }).click();
  await chapter.getByRole('combobox', { name: 'Movement' }).fill(movement);
  await page.getByRole('option', { name: /Add to the dictionary/ }).click();
  const dialog = page.getByRole('dialog', { name: 'Add a movement to the dictionary' });
  await dialog.getByLabel('Pattern').selectOption('lunge');
  await dialog.getByRole('button', { name: 'Add it' }).click();
  await expect(dialog).toBeHidden();
  await expect(chapter.getByLabel('Title')).toHaveValue(movement);
  await chapter.getByLabel('Block of the session').selectOption({ index: 2 });

  for (let step = 0; step < 5; step++) await forward.click();
  await page.getByRole('button', { name: /^Start here/ }).click();
  await chapter.getByText('Substitution', { exact: true }).click();
  await chapter.getByRole('combobox', { name: 'Movement' }).fill('Line hop');
  await page.getByRole('option', { name: /^Line hop/ }).click();
  await chapter.getByRole('combobox', { name: 'Stands in for' }).fill('Rope skip');
  await page.getByRole('option', { name: /^Rope skip/ }).click();
  await chapter.getByLabel('Does without').selectOption('kit');
  await chapter.getByLabel('Which kit').selectOption({ label: 'rope' });
  await saved(page);

  // a slip, and undo
  await chapter.getByRole('button', { name: /^Remove/ }).click();
  await expect(page.getByText('Line hop', { exact: true })).toHaveCount(0);
  await page.getByRole('button', { name: /^Undo/ }).click();
  await expect(page.getByText('Line hop', { exact: true }).first()).toBeVisible();
  await saved(page);
  await picture(page, `journey-marked-${project.name}`);
  await isInOrder(page);
  await page.reload();
  await expect(page.getByText(movement, { exact: true }).first()).toBeVisible();

  await page.getByRole('link', { name: 'Check & publish' }).click();
  await page.getByRole('button', { name: /^Publish/ }).click();
  await expect(page.getByText(/published/i).first()).toBeVisible();
  await expect(page.getByRole('button', { name: 'Take back to a draft' })).toBeVisible();
  await picture(page, `journey-published-${project.name}`);
  await isInOrder(page);
});

test('the editor brings captions, corrects a line and pins a cue', async ({ as }, { project }) => {
  const { session } = planOf(project.name);
  const page = await as('editor');
  await openFootage(page, session, 'Words');
  const file = (text: string) => ({ name: 'take.vtt', mimeType: 'text/vtt', buffer: Buffer.from(text) });
  await page.locator('input[type=file]').first().setInputFiles(file('WEBVTT\n\n00:05.000 --> 00:02.000\nBackwards\n'));
  await expect(page.getByText(/line 3/i).first()).toBeVisible();
  await page.keyboard.press('Escape');
  await page
    .locator('input[type=file]')
    .first()
    .setInputFiles(
      file('WEBVTT\n\n00:02.000 --> 00:04.500\nStep over the lock.\n\n00:05.000 --> 00:07.000\nStand tall.\n'),
    );
  const line = page.getByRole('textbox', { name: 'Line at 0:02.0' });
  await expect(line).toHaveValue('Step over the lock.');
  await line.fill('Step over the log.');
  await line.blur();
  await saved(page);

  await page.getByRole('button', { name: 'Play from 5 seconds' }).click();
  await page.getByRole('button', { name: /^Pin what is said here/ }).click();
  const form = page.getByRole('form', { name: 'New cue' });
  await form.getByLabel('Cue').fill('Stand all the way up');
  await form.getByRole('button', { name: 'Pin it' }).click();
  await saved(page, 'Cues: saved');
  await page.getByRole('button', { name: 'Change “Stand all the way up”' }).click();
  const change = page.getByRole('form', { name: 'Change the cue' });
  await change.getByLabel('Cue').fill('Stand all the way up before you step down');
  await change.getByRole('button', { name: 'Done' }).click();
  await saved(page, 'Cues: saved');
  await picture(page, `journey-words-${project.name}`);
  await isInOrder(page);

  await page.reload();
  await expect(line).toHaveValue('Step over the log.');
  await expect(page.getByText('Stand all the way up before you step down')).toBeVisible();
  await page.getByRole('button', { name: /^Versions$/ }).click();
  const versions = page.getByRole('dialog');
  await expect(versions.getByText(/Sunniva Krellborn/).first()).toBeVisible();
  await page.keyboard.press('Escape');
});

test('the member types the movement with a typo, and one tap plays that second', async ({ as }, { project }) => {
  const { movement, typo, session } = planOf(project.name);
  const page = await as('member');
  const complaints = complaintsOf(page);
  await page.goto(`${team}/find`);
  const box = page.getByRole('main').getByRole('combobox', { name: 'Find a movement or a word' });
  await box.fill(typo);
  await box.press('Enter');
  await expect(page.getByRole('heading', { name: new RegExp(`^${movement}`) })).toBeVisible();
  await picture(page, `journey-found-${project.name}`);
  await isInOrder(page);
  await page.getByRole('link', { name: /^Demo/ }).first().click();
  await expect(page).toHaveURL(/\/watch\/.*t=2/);
  await expect(page.getByRole('heading', { level: 1, name: movement })).toBeVisible();
  const video = page.locator('video');
  await expect.poll(() => video.evaluate((one: HTMLVideoElement) => one.readyState)).toBeGreaterThan(1);
  await expect.poll(() => video.evaluate((one: HTMLVideoElement) => one.currentTime)).toBeGreaterThanOrEqual(2);
  await expect(page.getByText('Stand all the way up before you step down')).toBeVisible();
  await picture(page, `journey-watched-${project.name}`);
  await isInOrder(page);

  // a word that was said leads to its line
  await page.goto(`${team}/find?q=stand+tall`);
  await expect(page.getByText('Said or written')).toBeVisible();
  // the day shows the session that was just published
  await page.goto(`${team}/find?q=${encodeURIComponent(movement)}`);
  await expect(page.getByRole('link', { name: /^Demo/ }).first()).toBeVisible();
  expect(session).not.toBe('');
  expect(complaints).toEqual([]);
});

test('a link to a moment lands within a frame', async ({ as }, { project }) => {
  const page = await as('member');
  await page.goto(`${team}/find?q=${encodeURIComponent(planOf(project.name).movement)}`);
  const href = await page.getByRole('link', { name: /^Demo/ }).first().getAttribute('href');
  const recording = new URL(href ?? '', page.url()).pathname;
  for (const wanted of [2.0, 3.7, 4.633]) {
    await page.goto(`${recording}?t=${wanted}`);
    const video = page.locator('video');
    await expect
      .poll(() =>
        video.evaluate((one: HTMLVideoElement) => (one.readyState > 1 && !one.seeking ? one.currentTime : -1)),
      )
      .toBeGreaterThan(0);
    const shown = await video.evaluate((one: HTMLVideoElement) => one.currentTime);
    expect(Math.abs(shown - wanted), `${shown} for ${wanted}`).toBeLessThanOrEqual(1 / 30);
  }
});
