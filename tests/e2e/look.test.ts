import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import type { AxeResults } from 'axe-core';
import type { Page } from 'playwright-core';
import { describe, expect, test } from 'vitest';
import { useBrowser } from '../support/browser';
import { PASSWORD, PEOPLE, signInAs, type Who } from '../support/people';

const { visit } = useBrowser();
const AXE = readFileSync(createRequire(import.meta.url).resolve('axe-core/axe.min.js'), 'utf8');
const RULES = ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa', 'best-practice'];

const overflow = (page: Page) => page.evaluate(() => document.documentElement.scrollWidth - window.innerWidth);
const theme = (page: Page) => page.locator('html').getAttribute('data-theme');
const ground = (page: Page) => page.evaluate(() => getComputedStyle(document.body).backgroundColor);

async function complaints(page: Page): Promise<string[]> {
  await page.evaluate(AXE);
  const results = await page.evaluate(
    (rules) => (window as unknown as { axe: { run: (o: object) => Promise<AxeResults> } }).axe.run({ runOnly: rules }),
    RULES,
  );
  return results.violations.map(({ id, nodes }) => `${id}: ${nodes[0]?.html}`);
}

const personMenu = (page: Page, name: RegExp) => page.locator('summary').filter({ hasText: name });

describe('signing in and out', () => {
  test('works without a script, and comes back to where one wanted to go', async () => {
    const { page } = await visit({ script: false });
    await page.goto('/account');
    await page.getByLabel('E-mail').fill(PEOPLE.designer);
    await page.getByLabel('Password').fill(PASSWORD);
    await page.getByRole('button', { name: 'Sign in' }).click();
    expect(new URL(page.url()).pathname).toBe('/account');
    await personMenu(page, /Tamsin/).click();
    await page.getByRole('button', { name: 'Sign out' }).click();
    await page.goto('/account');
    expect(new URL(page.url()).pathname).toBe('/sign-in');
  });

  test('says what is wrong above the form and beside the field, keeps the address, and moves focus to the summary', async () => {
    const { page } = await visit();
    await page.goto('/sign-in');
    await page.getByLabel('E-mail').fill(PEOPLE.designer);
    await page.getByRole('button', { name: 'Sign in' }).click();
    const summary = page.getByRole('alert');
    await summary.getByText('Enter your password.').waitFor();
    expect(await page.title()).toMatch(/^Error: /);
    expect(await page.getByLabel('E-mail').inputValue()).toBe(PEOPLE.designer);
    expect(await page.getByText('Enter your password.').count()).toBe(2);
    expect(await summary.evaluate((element) => element === document.activeElement)).toBe(true);
    await summary.getByRole('link').click();
    expect(await page.getByLabel('Password').evaluate((element) => element === document.activeElement)).toBe(true);
  });

  test('never leads to another site', async () => {
    const { page } = await visit();
    await page.goto('/sign-in?next=%2F%2Fevil.example%2F');
    await page.getByRole('button', { name: /Tamsin Vale/ }).click();
    await page.waitForURL((url) => url.pathname === '/');
    expect(await page.getByRole('heading', { level: 1 }).textContent()).toBe('Today');
  });

  test('forgets the unsaved work of who signs out, and nobody else’s', async () => {
    const { page } = await visit();
    await signInAs(page, 'engineer');
    const person = await page.locator('details[data-person]').getAttribute('data-person');
    const mine = `couplet-unsaved-${person}`;
    await page.evaluate(
      (names) =>
        Promise.all(
          names.map(
            (name) =>
              new Promise<void>((done) => {
                const request = indexedDB.open(name);
                request.onsuccess = () => done(request.result.close());
              }),
          ),
        ),
      [mine, 'couplet-unsaved-another'],
    );
    await personMenu(page, /Ilse/).click();
    await page.getByRole('button', { name: 'Sign out' }).click();
    await page.waitForURL('**/sign-in');
    const left = await page.evaluate(async () => (await indexedDB.databases()).map(({ name }) => name));
    expect(left).toContain('couplet-unsaved-another');
    expect(left).not.toContain(mine);
  });
});

describe('the theme', () => {
  test('follows the system until one chooses, then holds from page to page', async () => {
    const { page } = await visit({ dark: true });
    await page.goto('/sign-in');
    expect(await ground(page)).toBe('rgb(20, 24, 29)');
    await signInAs(page, 'designer');
    await personMenu(page, /Tamsin/).click();
    await page.getByLabel('Light').check();
    expect(await ground(page)).toBe('rgb(247, 245, 240)');
    await page.getByRole('link', { name: 'Account' }).click();
    await page.waitForURL('**/account');
    expect(await theme(page)).toBe('light');
    await page.getByLabel('As the system').last().check();
    await page.reload();
    expect(await theme(page)).toBeNull();
    expect(await ground(page)).toBe('rgb(20, 24, 29)');
  });
});

describe('the account page', () => {
  test('ends another session of one’s own', async () => {
    const [here, there] = [await visit(), await visit()];
    await signInAs(here.page, 'both');
    await signInAs(there.page, 'both');
    await here.page.goto('/account');
    await here.page
      .getByRole('button', { name: /^End the session/ })
      .first()
      .click();
    await here.page.getByText('That session has ended.').waitFor();
    await there.page.goto('/account');
    expect(new URL(there.page.url()).pathname).toBe('/sign-in');
  });

  test('refuses a new password without the old one', async () => {
    const { page } = await visit();
    await signInAs(page, 'designer');
    await page.goto('/account');
    await page.getByLabel('Password you have now').fill('not this one');
    await page.getByLabel('New password').fill('three unrelated words');
    await page.getByRole('button', { name: 'Change password' }).click();
    await page.getByRole('alert').getByText('This is not the password you have now.').waitFor();
  });
});

const PAGES: readonly (readonly [Who, readonly string[]])[] = [
  ['both', ['/', '/account', '/refused', '/nothing-here']],
  ['administrator', ['/', '/account']],
];

describe.each([
  { width: 1440, dark: false },
  { width: 390, dark: true },
  { width: 320, dark: false },
])('at $width px, dark: $dark', (screen) => {
  test('the sign-in page is accessible and no wider than the screen', async () => {
    const { page } = await visit(screen);
    await page.goto('/sign-in');
    expect(await complaints(page)).toEqual([]);
    expect(await overflow(page)).toBeLessThanOrEqual(0);
  });

  test.each(PAGES)('the pages of %s are accessible and no wider than the screen', async (who, paths) => {
    const { page } = await visit(screen);
    await signInAs(page, who);
    for (const path of paths) {
      await page.goto(path);
      expect(await complaints(page), path).toEqual([]);
      expect(await overflow(page), path).toBeLessThanOrEqual(0);
    }
  });
});
