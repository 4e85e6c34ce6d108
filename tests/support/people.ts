import type { Page } from 'playwright-core';

export const PASSWORD = 'couplet-demo';
export const PEOPLE = {
  engineer: 'ilse@kelda.example',
  librarian: 'soren@kelda.example',
  designer: 'tamsin@kelda.example',
  administrator: 'odd@kelda.example',
  both: 'petra@kelda.example',
} as const;
export type Who = keyof typeof PEOPLE;

/** Signs in through the screen, as a person does. */
export async function signInAs(page: Page, who: Who): Promise<void> {
  await page.goto('/sign-in');
  await page.getByLabel('E-mail').fill(PEOPLE[who]);
  await page.getByLabel('Password', { exact: true }).fill(PASSWORD);
  await page.getByRole('button', { name: 'Sign in' }).click();
  await page.waitForURL((url) => !url.pathname.startsWith('/sign-in'));
}
