import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import type { AxeResults } from 'axe-core';
import type { Page } from 'playwright-core';
import { describe, expect, test } from 'vitest';
import { addSheet, enterAs, open } from '../support/arrange';
import { useBrowser } from '../support/browser';

const { visit } = useBrowser();
const AXE = readFileSync(createRequire(import.meta.url).resolve('axe-core/axe.min.js'), 'utf8');
const RULES = ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa', 'best-practice'];

const overflow = (page: Page) => page.evaluate(() => document.documentElement.scrollWidth - window.innerWidth);
const activeId = (page: Page) => page.evaluate(() => document.activeElement?.id);

async function complaints(page: Page): Promise<string[]> {
  await page.evaluate(AXE);
  const results = await page.evaluate(
    (rules) => (window as unknown as { axe: { run: (o: object) => Promise<AxeResults> } }).axe.run({ runOnly: rules }),
    RULES,
  );
  return results.violations.map(({ id, nodes }) => `${id}: ${nodes[0]?.html}`);
}

/** An engineer at a new sheet of a vendor of its own, the form for a module open. */
async function atModuleForm(vendor: string, options: Parameters<typeof visit>[0] = {}): Promise<Page> {
  const { page } = await visit(options);
  await enterAs(page, 'engineer');
  const { id } = await addSheet(page, { vendor });
  await open(page, `/sheets/${id}`);
  await page.getByRole('button', { name: 'Add a module' }).click();
  await page.getByLabel('Part number').waitFor();
  return page;
}

async function typeModule(page: Page): Promise<void> {
  await page.getByLabel('Part number').fill('Godwit 30');
  await page.getByLabel('Couples').fill('127');
  await page.getByLabel('Cold plate width').fill('30 mm');
  await page.getByLabel('Cold plate depth').fill('30');
  await page.getByLabel('Height in mm').fill('3,6');
  await page.getByLabel('Hot side in °C').fill('27 °C');
  await page.getByLabel('Imax in A').fill('3,4 A');
  await page.getByLabel('Vmax in V').fill('15.4');
}

const row = (page: Page, name: string) => page.getByRole('listitem').filter({ has: page.getByText(name, { exact: true }) });

describe('modules of a sheet', () => {
  test('a module is typed as printed, with commas and units, and its reading starts at the bench', async () => {
    const page = await atModuleForm('Godwit Works');
    expect(await activeId(page)).toBe('module.partNumber');
    await typeModule(page);
    await page.getByLabel('Imax means').selectOption('largest ΔT');
    await page.getByText('The current that gives the largest temperature difference at this hot side.').waitFor();
    const sheet = page.url();
    await page.getByRole('button', { name: 'Add and start a reading' }).click();
    await page.waitForURL(/\/bench\/\d+$/);
    const bench = new URL(page.url()).pathname;
    await open(page, sheet);
    const facts = await row(page, 'Godwit 30').first().innerText();
    expect(facts.replace(/\u00a0/g, ' ')).toContain('127 couples · cold plate 30 × 30 mm · 3.6 mm high');
    expect(facts.replace(/\u00a0/g, ' ')).toContain('Hot side 27 °C: 3.4 A, 15.4 V');
    expect(await page.getByRole('link', { name: 'Go on with your reading of Godwit 30' }).getAttribute('href')).toBe(bench);
    const reading = page.getByRole('row', { name: /Godwit 30/ });
    expect(await reading.innerText()).toMatch(/draft\s+you/);
    expect(await reading.getByRole('link', { name: 'Godwit 30' }).getAttribute('href')).toBe(bench);
  });

  test('what is wrong is listed from top to bottom, and pressing the button from a faulty field is not lost', async () => {
    const page = await atModuleForm('Ruff Works');
    await typeModule(page);
    await page.getByLabel('Couples').fill('12,5');
    await page.getByLabel('Cold plate depth').fill('');
    await page.getByLabel('Qmax in W').fill('28 K');
    await page.getByLabel('Tolerance').fill('ten');
    await page.getByRole('button', { name: 'Add only' }).click();
    const summary = page.getByRole('alert').filter({ hasText: 'There is a problem' });
    await summary.waitFor();
    expect(await summary.getByRole('link').allInnerTexts()).toEqual([
      'Couples must be a whole number, like 127.',
      'Enter both width and depth of the cold plate, or neither.',
      'This field is in W: leave out “K” and type the value in W.',
      '“ten” is not a number: type digits, such as 2.5.',
    ]);
    await summary.getByRole('link').last().click();
    expect(await activeId(page)).toBe('module.ratings[1].tolerancePercent');
    await page.keyboard.press('Control+A');
    await page.keyboard.type('10');
    await page.getByLabel('Qmax in W').fill('28');
    await page.getByLabel('Cold plate depth').fill('30');
    await page.getByLabel('Couples').fill('12');
    await page.getByRole('button', { name: 'Add only' }).click();
    await page.getByText('Godwit 30 is added.').waitFor();
  });

  test('another hot side begins as the one before it is meant, and a hot side can be removed', async () => {
    const page = await atModuleForm('Avocet Works');
    await typeModule(page);
    await page.getByLabel('Basis').selectOption('minimum');
    await page.getByRole('button', { name: 'Add a hot side' }).click();
    await expect.poll(() => activeId(page)).toBe('module.ratings[2].hotSideC');
    await page.keyboard.type('50');
    await page.keyboard.press('Tab');
    await page.keyboard.type('3.3');
    await page.keyboard.press('Tab');
    expect(await page.getByLabel('Basis').nth(1).inputValue()).toBe('minimum');
    await page.getByRole('button', { name: 'Remove At 27 °C' }).click();
    await page.getByRole('button', { name: 'Add only' }).click();
    await page.getByText('Godwit 30 is added.').waitFor();
    const facts = await row(page, 'Godwit 30').first().innerText();
    expect(facts.match(/Hot side/g)).toHaveLength(1);
    expect(facts).toMatch(/Hot side 50\u00a0°C: 3\.3\u00a0A/);
  });

  test('the same part twice is refused in a sentence, and a sister is added from it', async () => {
    const page = await atModuleForm('Whimbrel Works');
    await typeModule(page);
    await page.getByRole('button', { name: 'Add only' }).click();
    await page.getByRole('button', { name: 'Add one like it: Godwit 30' }).click();
    await page.getByLabel('Part number').fill('godwit 30');
    await page.getByRole('button', { name: 'Add only' }).click();
    await page.getByText('Whimbrel Works Godwit 30 is already in the catalogue: use that one, or give this one a variant.').waitFor();
    await page.getByLabel('Variant').fill('sealed');
    await page.getByRole('button', { name: 'Add only' }).click();
    await page.getByText('godwit 30 sealed is added.').waitFor();
    expect((await row(page, 'godwit 30 sealed').first().innerText()).replace(/\u00a0/g, ' ')).toContain('127 couples');
  });

  test('of two people at one module, the second sees what differs and may take theirs', async () => {
    const mine = await atModuleForm('Knot Works');
    await typeModule(mine);
    await mine.getByRole('button', { name: 'Add only' }).click();
    await mine.getByRole('button', { name: 'Edit Godwit 30' }).waitFor();
    const { page: theirs } = await visit();
    await enterAs(theirs, 'librarian');
    await open(theirs, mine.url());
    for (const [page, couples] of [
      [mine, '128'],
      [theirs, '126'],
    ] as const) {
      await page.getByRole('button', { name: 'Edit Godwit 30' }).click();
      await page.getByLabel('Couples').fill(couples);
    }
    await theirs.getByRole('button', { name: 'Save' }).click();
    await theirs.getByText('Saved.').waitFor();
    await mine.getByRole('button', { name: 'Save' }).click();
    await mine.getByRole('row', { name: 'Couples 128 126' }).waitFor();
    await mine.getByRole('button', { name: 'Take theirs' }).click();
    await mine.getByText('126 couples').waitFor();
    await expect.poll(() => activeId(mine)).toMatch(/^edit-\d+$/);
  });
});

describe('who sees what', () => {
  test('a designer finds a vendor’s modules but no sheets that are not approved', async () => {
    const engineer = await atModuleForm('Plover Works');
    await typeModule(engineer);
    await engineer.getByRole('button', { name: 'Add only' }).click();
    await engineer.getByText('Godwit 30 is added.').waitFor();
    await engineer.getByRole('link', { name: 'Plover Works' }).click();
    await engineer.getByRole('heading', { name: 'Sheets' }).waitFor();
    const { page } = await visit();
    await enterAs(page, 'designer');
    await page.goto(engineer.url());
    await page.getByRole('rowheader', { name: 'Godwit 30' }).waitFor();
    expect(await page.getByRole('heading', { name: 'Sheets' }).count()).toBe(0);
    expect(await page.getByRole('link', { name: /Add a sheet/ }).count()).toBe(0);
  });
});

describe.each([
  { width: 1440, dark: false },
  { width: 390, dark: true },
])('at $width px, dark $dark', ({ width, dark }) => {
  test('every sheets screen passes the accessibility rules and nothing is wider than the window', async () => {
    const page = await atModuleForm(`Sandpiper ${width}`, { width, dark });
    expect(await complaints(page)).toEqual([]);
    expect(await overflow(page)).toBeLessThanOrEqual(0);
    await typeModule(page);
    await page.getByRole('button', { name: 'Add only' }).click();
    await page.getByText('Godwit 30 is added.').waitFor();
    const sheet = page.url();
    await page.getByRole('link', { name: `Sandpiper ${width}` }).click();
    for (const address of [page.url(), '/sheets', '/sheets/new', sheet]) {
      await open(page, address);
      expect(await complaints(page), address).toEqual([]);
      expect(await overflow(page), address).toBeLessThanOrEqual(0);
    }
  });
});
