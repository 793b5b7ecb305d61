import { complaintsOf, isInOrder, picture } from './support/looks';
import { expect, signInByHand, team, test } from './support/people';

const mailsTo = async (address: string) => {
  const answer = await fetch(`${process.env.MAIL_URL}/messages.json`);
  const messages = (await answer.json()) as { to: string[]; links: string[]; text: string }[];
  return messages.filter(({ to }) => to.some((one) => one.includes(address)));
};

async function linkTo(address: string): Promise<string> {
  let link = '';
  await expect(async () => {
    link = (await mailsTo(address))[0]?.links[0] ?? '';
    expect(link).toContain('#');
  }).toPass({ timeout: 30_000 });
  return link;
}

test('the sign-in page is in order, says what is wrong and leads back to where one wanted to go', async ({
  browser,
}, info) => {
  const context = await browser.newContext({ baseURL: process.env.BASE_URL });
  const page = await context.newPage();
  const complaints = complaintsOf(page);
  await page.goto(`${team}/find?q=row`);
  await expect(page).toHaveURL(/\/sign-in\?back=/);
  await expect(page.getByRole('heading', { name: 'Sign in' })).toBeVisible();
  await isInOrder(page);
  await picture(page, `sign-in-${info.project.name}`);
  await page.getByLabel('E-mail').fill('bo@apple-loft.example');
  await page.getByRole('textbox', { name: 'Password' }).fill('not the right words');
  await page.getByRole('button', { name: 'Sign in' }).click();
  await expect(page.getByRole('alert')).toContainText('do not belong together');
  // a refused sign-in is the browser's to note, everything else would be ours
  expect(complaints.filter((line) => !line.includes('401'))).toEqual([]);
  await context.close();
});

test('the owner invites a person, who joins once with the link from the mail; a forgotten password is set anew', async ({
  as,
  browser,
}, info) => {
  const address = `newcomer-${info.project.name}@mail.example`;
  const owner = await as('owner');
  await owner.goto(`${team}/people`);
  await owner.getByLabel('E-mail').fill(address);
  await owner.getByLabel('Role', { exact: true }).selectOption('member');
  await owner.getByRole('button', { name: 'Send the invitation' }).click();
  await expect(owner.getByText(`Sent to ${address}.`)).toBeVisible();

  const link = await linkTo(address);
  const context = await browser.newContext({ baseURL: process.env.BASE_URL });
  const page = await context.newPage();
  await page.goto(link);
  await expect(page.getByRole('heading', { name: 'Join Apple Loft' })).toBeVisible();
  await isInOrder(page);
  await picture(page, `join-${info.project.name}`);
  await page.getByLabel('What people call you').fill('Noor Vance');
  await page.getByRole('textbox', { name: 'Choose a password' }).fill('too short');
  await page.getByRole('button', { name: 'Join Apple Loft' }).click();
  await expect(page.getByText('At least 15 characters; a few words in a row are good.')).toBeVisible();
  await page.getByRole('textbox', { name: 'Choose a password' }).fill('grey herons over water');
  await page.getByRole('button', { name: 'Join Apple Loft' }).click();
  await expect(page.getByRole('heading', { name: 'Before you train' })).toBeVisible();
  await page.getByRole('button', { name: 'I have read this' }).click();
  await expect(page).toHaveURL(/\/today$/);

  const again = await (await browser.newContext()).newPage();
  await again.goto(link);
  await expect(again.getByRole('heading', { name: 'This invitation does not work' })).toBeVisible();

  const mailsBefore = (await mailsTo(address)).length;
  await again.goto(new URL('/forgot-password', link).href);
  await again.getByLabel('E-mail').fill(address);
  await again.getByRole('button', { name: 'Send the link' }).click();
  await expect(again.getByRole('heading', { name: 'Look into your mail' })).toBeVisible();
  await expect(async () => expect((await mailsTo(address)).length).toBeGreaterThan(mailsBefore)).toPass({
    timeout: 30_000,
  });
  await again.goto(await linkTo(address));
  await again.getByRole('textbox', { name: 'New password' }).fill('brown herons over sand');
  await again.getByRole('button', { name: 'Set the password' }).click();
  await expect(again.getByRole('heading', { name: 'The password is set' })).toBeVisible();

  // the other device is signed out
  await page.goto('/account');
  await expect(page).toHaveURL(/\/sign-in/);
  await context.close();
  await again.context().close();
});

test('members do not get to the desk, and the team switcher changes what one may do', async ({ as }) => {
  const member = await as('member');
  await member.goto(`${team}/sessions`);
  await expect(member.getByRole('heading', { name: 'This is where coaches work' })).toBeVisible();
  const coach = await as('coach');
  await coach.goto(`${team}/sessions`);
  await coach.getByRole('button', { name: /Apple Loft, Dario/ }).click();
  await coach.getByRole('link', { name: 'Go to Print Works Lunch Crew' }).click();
  await expect(coach).toHaveURL(/\/t\/lunch-crew\/today/);
});

test('signing out leaves nothing behind', async ({ browser }) => {
  const page = await browser.newPage({ baseURL: process.env.BASE_URL });
  await signInByHand(page, 'member');
  await page.getByRole('button', { name: /Apple Loft, Bo/ }).click();
  await page.getByRole('button', { name: 'Sign out' }).click();
  await expect(page).toHaveURL(/\/sign-in/);
  await expect(page.getByRole('heading', { name: 'Sign in' })).toBeVisible();
  await page.goto(`${team}/today`);
  await expect(page).toHaveURL(/\/sign-in/);
  await page.close();
});
