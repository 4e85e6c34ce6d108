import { randomBytes } from 'node:crypto';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import type { Locator, Page } from 'playwright-core';
import sharp from 'sharp';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { addSheet, enterAs, listens, open, readFirstPage } from '../support/arrange';
import { useBrowser } from '../support/browser';

const { visit } = useBrowser();
const chart = (name: string) => path.resolve('tests/fixtures/charts', name);
const folder = mkdtempSync(path.join(os.tmpdir(), 'couplet-sheets-'));
const made = (name: string) => path.join(folder, name);
const SLOW_BYTES_A_SECOND = 1_500_000;

beforeAll(async () => {
  writeFileSync(made('notes.txt'), 'not a picture');
  writeFileSync(made('huge.png'), Buffer.alloc(31 * 1024 * 1024));
  const noise = { raw: { width: 1400, height: 1400, channels: 3 } } as const;
  writeFileSync(
    made('slow.png'),
    await sharp(randomBytes(1400 * 1400 * 3), noise)
      .png({ compressionLevel: 1 })
      .toBuffer(),
  );
});
afterAll(() => rmSync(folder, { recursive: true }));

const vendorField = (page: Page) => page.getByRole('combobox', { name: 'Vendor' });
const files = (page: Page) => page.getByRole('list', { name: 'Files' });
const pages = (page: Page) => page.getByRole('img', { name: /^Page \d+/ });
const isFocused = (locator: Locator) => locator.evaluate((element) => element === document.activeElement);
const focused = (page: Page) => page.evaluate(() => document.activeElement?.textContent);

/** An engineer at a new sheet without pages. */
async function newSheet(title: string, number = ''): Promise<Page> {
  const { page } = await visit();
  await enterAs(page, 'engineer');
  const { id } = await addSheet(page, { vendor: 'Kittiwake Cold', title, number });
  await open(page, `/sheets/${id}`);
  return page;
}

const MOST_STOPS = 60;

/** Goes on with Tab until something has the keyboard. */
async function tabTo(page: Page, target: Locator): Promise<void> {
  for (let stops = 0; stops < MOST_STOPS; stops++) {
    if (await isFocused(target)) return;
    await page.keyboard.press('Tab');
  }
  throw new Error('Tab never came there.');
}

/** Chooses files as a person does, from the window that opens. */
async function choose(page: Page, ...names: string[]): Promise<void> {
  const chooser = page.waitForEvent('filechooser');
  await page.getByRole('button', { name: /^(Choose pictures|Add pages)$/ }).click();
  await (await chooser).setFiles(names);
}

describe('what a sheet is', () => {
  test('an empty form is refused above and beside the field, in the same words, and the summary leads there', async () => {
    const { page } = await visit();
    await enterAs(page, 'engineer');
    await open(page, '/sheets/new');
    await page.getByLabel('Date of the sheet').fill('03/04/2026');
    await page.getByRole('button', { name: 'Add the sheet' }).click();
    const summary = page.getByRole('alert');
    await summary.getByText('Enter the vendor as printed.').waitFor();
    expect(await page.title()).toMatch(/^Error: /);
    expect(await page.getByText('Enter the vendor as printed.').count()).toBe(2);
    expect(await summary.getByRole('link').allInnerTexts()).toEqual([
      'Enter the vendor as printed.',
      'Write the date as far as the sheet gives it: 2026-03-15, 2026-03 or 2026.',
    ]);
    expect(await page.getByLabel('Date of the sheet').inputValue()).toBe('03/04/2026');
    await summary.getByRole('link').first().click();
    expect(await isFocused(vendorField(page))).toBe(true);
  });

  test('a sheet, its page and its module are added by the keyboard alone, as far as the bench', async () => {
    const { page } = await visit();
    await enterAs(page, 'engineer');
    await open(page, '/sheets');
    await tabTo(page, page.getByRole('link', { name: 'Add a sheet' }));
    await page.keyboard.press('Enter');
    await page.waitForURL(/\/sheets\/new$/);
    await listens(page);
    await tabTo(page, vendorField(page));
    for (const typed of ['Dunlin Thermal', 'Dunlin series', 'DT-7', 'C', 'March 2026']) {
      await page.keyboard.type(typed);
      await page.keyboard.press('Tab');
    }
    await page.keyboard.press('Enter');
    await page.waitForURL(/\/sheets\/\d+$/);
    await listens(page);
    expect(await page.getByRole('heading', { level: 1 }).innerText()).toBe('Dunlin series');
    const stated = ['Dunlin Thermal', 'DT-7', 'C', 'Mar\u00a02026'];
    expect(await page.getByRole('definition').allInnerTexts()).toEqual(expect.arrayContaining(stated));
    await tabTo(page, page.getByRole('button', { name: 'Choose pictures' }));
    const chooser = page.waitForEvent('filechooser');
    await page.keyboard.press('Enter');
    await (await chooser).setFiles(chart('d09.png'));
    await files(page).getByText('is page 1').waitFor();
    await tabTo(page, page.getByRole('button', { name: 'Add a module' }));
    await page.keyboard.press('Enter');
    await page.getByLabel('Part number').waitFor();
    await page.keyboard.type('Dunlin 15');
    await page.keyboard.press('Enter');
    await page.waitForURL(/\/bench\/\d+$/);
  });

  test('a vendor that is not known is said to be new', async () => {
    const page = await newSheet('Known vendor');
    await open(page, '/sheets/new');
    await vendorField(page).fill('kittiwake cold');
    await page.getByText('Whose sheet this is, as printed.').waitFor();
    await vendorField(page).fill('Kittiwak Cold');
    await page.getByText('A new vendor: it is added with this sheet.').waitFor();
  });

  test('sheets are found by words in the address, without a script', async () => {
    await newSheet('Turnstone series', 'KC-40');
    const { page } = await visit({ script: false });
    await enterAs(page, 'librarian');
    await page.goto('/sheets');
    await page.getByLabel('Find a sheet').fill('turnstone kc-40');
    await page.getByRole('button', { name: 'Find' }).click();
    expect(new URL(page.url()).searchParams.get('q')).toBe('turnstone kc-40');
    await page.getByRole('link', { name: 'Turnstone series' }).waitFor();
    await page.goto('/sheets?q=turnstone+nowhere');
    await page.getByRole('heading', { name: 'No sheet has “turnstone nowhere”' }).waitFor();
  });

  test('of two people at one sheet, the second sees both versions and chooses', async () => {
    const mine = await newSheet('Before');
    const { page: theirs } = await visit();
    await enterAs(theirs, 'librarian');
    await open(theirs, mine.url());
    for (const [page, title] of [
      [mine, 'Mine'],
      [theirs, 'Theirs'],
    ] as const) {
      await page.getByRole('button', { name: 'Edit', exact: true }).click();
      await page.getByLabel('Title').fill(title);
    }
    await theirs.getByRole('button', { name: 'Save' }).click();
    await theirs.getByRole('heading', { level: 1, name: 'Theirs' }).waitFor();
    await mine.getByRole('button', { name: 'Save' }).click();
    await mine.getByRole('row', { name: 'Title Mine Theirs' }).waitFor();
    await mine.getByRole('button', { name: 'Keep mine' }).click();
    await mine.getByRole('heading', { level: 1, name: 'Mine' }).waitFor();
    await theirs.reload();
    await theirs.getByRole('heading', { level: 1, name: 'Mine' }).waitFor();
  });
});

describe('pages of a sheet', () => {
  test('several pictures are chosen at once: a refusal stands by its file and the rest goes on', async () => {
    const page = await newSheet('Browse');
    await choose(page, chart('d01.png'), made('notes.txt'), made('huge.png'), chart('d05.jpg'), chart('d01.png'));
    const row = (name: string, nth = 0) => files(page).getByRole('listitem').filter({ hasText: name }).nth(nth);
    await row('d01.png', 1).getByText('already page 1 of this sheet, so nothing was added').waitFor();
    expect(await row('d01.png').innerText()).toContain('is page 1');
    expect(await row('d05.jpg').innerText()).toContain('is page 2');
    expect(await row('notes.txt').innerText()).toContain('This file is not a picture.');
    expect(await row('huge.png').innerText()).toContain('The file is larger than 30\u00A0MB.');
    expect(await pages(page).count()).toBe(2);
    await page.getByRole('button', { name: 'Clear the list' }).click();
    expect(await files(page).count()).toBe(0);
  });

  test('the same file is recognised on another sheet, with the way there', async () => {
    await newSheet('First home').then(async (page) => {
      await choose(page, chart('d06.jpg'));
      await files(page).getByText('is page 1').waitFor();
    });
    const page = await newSheet('Second home');
    await choose(page, chart('d06.jpg'));
    await files(page).getByText('The same file is already on').waitFor();
    await page.getByRole('link', { name: 'First home' }).click();
    await page.getByRole('heading', { level: 1, name: 'First home' }).waitFor();
  });

  test('a picture that is let go over the pages is taken, one beside them leaves the page as it is', async () => {
    const page = await newSheet('Drop');
    const drag = await page.context().newCDPSession(page);
    const drop = async (x: number, y: number) => {
      const data = { items: [], files: [chart('d04.png')], dragOperationsMask: 1 };
      for (const type of ['dragEnter', 'dragOver', 'drop'] as const) await drag.send('Input.dispatchDragEvent', { type, x, y, data });
    };
    const beside = await page.getByRole('heading', { level: 1 }).boundingBox();
    await drop(beside!.x + 5, beside!.y + 5);
    const zone = await page.getByText('This sheet has no pages yet.').boundingBox();
    await drop(zone!.x + 5, zone!.y + 5);
    await files(page).getByText('is page 1').waitFor();
    expect(await files(page).getByRole('listitem').count()).toBe(1);
    expect(await page.getByRole('heading', { level: 1 }).innerText()).toBe('Drop');
  });

  test('a picture on the clipboard is pasted by key and by button', async () => {
    const page = await newSheet('Paste');
    await page.evaluate(async () => {
      const canvas = Object.assign(document.createElement('canvas'), { width: 60, height: 40 });
      canvas.getContext('2d')!.fillRect(10, 10, 20, 20);
      const picture = new Promise<Blob>((done) => canvas.toBlob((blob) => done(blob!), 'image/png'));
      await navigator.clipboard.write([new ClipboardItem({ 'image/png': picture })]);
    });
    await page.keyboard.press('Control+V');
    await files(page).getByText('is page 1').waitFor();
    await page.getByRole('img', { name: 'Page 1, Pasted picture 1' }).waitFor();
    await page.getByRole('button', { name: 'Paste a picture' }).click();
    await files(page).getByText('already page 1 of this sheet').waitFor();
  });

  test('what waits and what is on its way can be cancelled, and the rest goes on', async () => {
    const page = await newSheet('Cancel');
    const line = await page.context().newCDPSession(page);
    await line.send('Network.enable');
    const slow = { offline: false, latency: 0, downloadThroughput: -1, uploadThroughput: SLOW_BYTES_A_SECOND };
    await line.send('Network.emulateNetworkConditions', slow);
    await choose(page, made('slow.png'), chart('d02.png'), chart('d03.png'));
    await files(page)
      .getByText(/of 5\.\d\u00a0MB/)
      .waitFor();
    await page.getByRole('button', { name: 'Cancel d02.png' }).click();
    await expect.poll(() => focused(page)).toBe('Choose pictures');
    await page.getByRole('button', { name: 'Cancel slow.png' }).click();
    await files(page).getByText('is page 1').waitFor();
    expect(await files(page).getByRole('listitem').allInnerTexts()).toEqual([
      expect.stringContaining('cancelled'),
      expect.stringContaining('cancelled'),
      expect.stringContaining('is page 1'),
    ]);
    await page.reload();
    expect(await pages(page).count()).toBe(1);
  });

  test('a page is taken off after a question, and focus does not get lost', async () => {
    const page = await newSheet('Take off');
    await choose(page, chart('d07.jpg'));
    await page.getByRole('button', { name: 'Remove page 1' }).click();
    await expect.poll(() => focused(page)).toBe('Keep it');
    await page.keyboard.press('Enter');
    await expect.poll(() => focused(page)).toBe('Remove');
    await page.keyboard.press('Enter');
    await page.getByRole('button', { name: 'Take it off' }).click();
    await page.getByText('The page is off the sheet.').waitFor();
    expect(await pages(page).count()).toBe(0);
    await expect.poll(() => focused(page)).toBe('Pages');
  });

  test('a page on which a reading stands stays, and it is said why', async () => {
    const page = await newSheet('Stays');
    await choose(page, chart('d08.png'));
    await files(page).getByText('is page 1').waitFor();
    await readFirstPage(page, Number(page.url().split('/').at(-1)), 'Stint 4');
    await page.getByRole('button', { name: 'Remove page 1' }).click();
    await page.getByRole('button', { name: 'Take it off' }).click();
    await page.getByText('A reading stands on this page, so it stays.').waitFor();
    expect(await pages(page).count()).toBe(1);
  });
});
