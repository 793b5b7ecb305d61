import { type Browser, test as base, expect, type Page } from '@playwright/test';

/** The demo team's people, signed in once each for a run. */

export const team = '/t/apple-loft';

const emails = {
  owner: 'wilma@apple-loft.example',
  coach: 'dario@apple-loft.example',
  editor: 'sunniva@apple-loft.example',
  member: 'bo@apple-loft.example',
} as const;
export type Who = keyof typeof emails;

const password = () => (JSON.parse(process.env.SIGN_INS ?? '[]') as { password: string }[])[0]?.password ?? '';

type State = Awaited<ReturnType<Awaited<ReturnType<Browser['newContext']>>['storageState']>>;
const states = new Map<Who, State>();

/** Signs in by hand: the sign-in page, then the first-use notice where it was not read yet. */
export async function signInByHand(page: Page, who: Who): Promise<void> {
  await page.goto('/sign-in');
  await page.getByLabel('E-mail').fill(emails[who]);
  await page.getByRole('textbox', { name: 'Password' }).fill(password());
  await page.getByRole('button', { name: 'Sign in' }).click();
  await page.waitForURL(/\/t\/apple-loft\//);
  await expect(page.getByRole('heading', { level: 1 }).first()).toBeVisible();
  const read = page.getByRole('button', { name: 'I have read this' });
  if (await read.isVisible()) {
    await read.click();
    await expect(read).toBeHidden();
  }
}

type Fixtures = {
  /** a page of a person's own; sign-ins are kept for the run, as the limit by address counts them */
  as: (who: Who) => Promise<Page>;
};

export const test = base.extend<Fixtures>({
  as: async ({ browser, viewport, hasTouch, isMobile }, use) => {
    const contexts: { close(): Promise<void> }[] = [];
    await use(async (who) => {
      const known = states.get(who);
      const context = await browser.newContext({
        baseURL: process.env.BASE_URL,
        viewport,
        hasTouch,
        isMobile,
        ...(known ? { storageState: known } : {}),
      });
      contexts.push(context);
      const page = await context.newPage();
      if (!known) {
        await signInByHand(page, who);
        states.set(who, await context.storageState());
      }
      return page;
    });
    for (const context of contexts) await context.close();
  },
});

export { expect };
