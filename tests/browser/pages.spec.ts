import type { Page } from '@playwright/test';
import { complaintsOf, isInOrder, picture } from './support/looks';
import { expect, team, test, type Who } from './support/people';

/** Every page, at every width, in both themes: axe finds nothing, nothing scrolls sideways, the browser complains of nothing. */

const widths = [320, 390, 768, 1280, 2560];

const pages: { name: string; who: Who; path: string | ((page: Page) => Promise<string>) }[] = [
  { name: 'today', who: 'member', path: `${team}/today` },
  { name: 'find', who: 'member', path: `${team}/find?q=rinng+row` },
  { name: 'find-nothing', who: 'member', path: `${team}/find?q=zzzz` },
  { name: 'watch', who: 'member', path: watchPath },
  { name: 'my-kit', who: 'member', path: `${team}/my-kit` },
  { name: 'dictionary', who: 'member', path: `${team}/dictionary` },
  {
    name: 'movement',
    who: 'member',
    path: async (page) => firstLink(page, `${team}/dictionary`, /\/dictionary\/[0-9a-f-]{36}/),
  },
  { name: 'notices', who: 'coach', path: `${team}/notices` },
  { name: 'sessions', who: 'coach', path: `${team}/sessions` },
  {
    name: 'session',
    who: 'coach',
    path: async (page) => firstLink(page, `${team}/sessions`, /\/sessions\/[0-9a-f-]{36}/),
  },
  { name: 'footage', who: 'coach', path: `${team}/footage` },
  { name: 'mark', who: 'coach', path: async (page) => firstLink(page, `${team}/footage`, /\/footage\/[0-9a-f-]{36}/) },
  { name: 'words-queue', who: 'editor', path: `${team}/words` },
  { name: 'words', who: 'editor', path: async (page) => firstLink(page, `${team}/words`, /\/words\/[0-9a-f-]{36}/) },
  { name: 'movements', who: 'editor', path: `${team}/movements` },
  {
    name: 'movement-desk',
    who: 'editor',
    path: async (page) => firstLink(page, `${team}/movements`, /\/movements\/[0-9a-f-]{36}/),
  },
  { name: 'kit', who: 'coach', path: `${team}/kit` },
  { name: 'people', who: 'owner', path: `${team}/people` },
  { name: 'trail', who: 'owner', path: `${team}/trail` },
  { name: 'account', who: 'owner', path: '/account' },
  { name: 'nothing', who: 'owner', path: '/nowhere' },
];

async function firstLink(page: Page, list: string, pattern: RegExp): Promise<string> {
  await page.goto(list);
  const link = page.locator('main a').filter({ visible: true }).and(page.locator('[href]'));
  await expect(async () => {
    expect(await hrefs()).toEqual(expect.arrayContaining([expect.stringMatching(pattern)]));
  }).toPass();
  return (await hrefs()).find((href) => pattern.test(href)) as string;
  async function hrefs() {
    return link.evaluateAll((links) => links.map((one) => one.getAttribute('href') ?? ''));
  }
}

async function watchPath(page: Page): Promise<string> {
  return firstLink(page, `${team}/today`, /\/watch\/[0-9a-f-]{36}/);
}

test.describe('every page', () => {
  for (const { name, who, path } of pages) {
    test(name, async ({ as }) => {
      const page = await as(who);
      const complaints = complaintsOf(page);
      const address = typeof path === 'string' ? path : await path(page);
      await page.goto(address);
      for (const theme of ['dark', 'light']) {
        await page.evaluate((choice) => localStorage.setItem('tapeline.theme', choice), theme);
        await page.goto(address);
        await expect(page.getByRole('heading', { level: 1 }).first()).toBeAttached();
        await page.waitForLoadState('networkidle').catch(() => undefined);
        for (const width of widths) {
          await page.setViewportSize({ width, height: width < 700 ? 844 : 900 });
          await page.waitForTimeout(150);
          await picture(page, `${name}-${theme}-${width}`);
          await isInOrder(page);
        }
      }
      expect(complaints).toEqual([]);
    });
  }
});
