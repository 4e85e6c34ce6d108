import type { BrowserContext, Page } from 'playwright-core';
import { beforeAll, describe, expect, test } from 'vitest';
import { clientOf } from '../support/api';
import { approveModule, sheetWithChart } from '../support/approved';
import { axeFindings } from '../support/axe';
import { useBrowser } from '../support/browser';
import { signInAs } from '../support/people';

const { base, visit } = useBrowser();
const VENDOR = 'Quillback Cooling';
const rating = {
  hotSideC: 27,
  imaxA: 6,
  vmaxV: 15,
  qmaxW: 40,
  dTmaxK: 60,
  basis: 'typical',
  atmosphere: 'air',
  tolerancePercent: 10,
} as const;

/** Three modules of one vendor: a plain one, one of half the heat without any size stated, one of twice the couples. */
let plain: number;
beforeAll(async () => {
  const team = { engineer: await clientOf(base, 'engineer'), librarian: await clientOf(base, 'librarian') };
  const sheet = await sheetWithChart(team.engineer, VENDOR, 'QC-7');
  const stated = {
    vendor: VENDOR,
    stages: 1,
    couples: 127,
    maxTemperatureC: 120,
    ratings: [{ ...rating, imaxMeans: 'largestDeltaT' as const }],
  };
  plain = await approveModule(team, sheet, { ...stated, partNumber: 'Burbot 40-A', coldPlateMm: [40, 40], hotPlateMm: [40, 44] });
  await approveModule(team, sheet, { vendor: VENDOR, partNumber: 'Loach 20', stages: 1 }, { alpha: 0.025, R: 1.1, K: 0.2 });
  await approveModule(
    team,
    sheet,
    { ...stated, partNumber: 'Tench 62', couples: 254, coldPlateMm: [62, 62] },
    { alpha: 0.06, R: 2.6, K: 0.5 },
  );
});

const addressOf = (page: Page) => new URL(page.url());
const param = (page: Page, name: string) => addressOf(page).searchParams.get(name);
const parts = (page: Page) =>
  page.getByRole('region', { name: 'Modules', exact: true }).getByRole('rowheader').getByRole('link').allTextContents();
const overflow = (page: Page) => page.evaluate(() => document.documentElement.scrollWidth - window.innerWidth);
/** Plain spaces in place of those that do not break. */
const plainSpaces = (text: string | null) => (text ?? '').replace(/[\u00A0\u202F]/g, ' ');

let signedIn: Awaited<ReturnType<BrowserContext['cookies']>> | undefined;

/** A window of the designer, who signs in by the screen once. */
async function designer(options: Parameters<typeof visit>[0] = {}): Promise<Page> {
  const { page, context } = await visit(options);
  if (signedIn) await context.addCookies(signedIn);
  else {
    await signInAs(page, 'designer');
    signedIn = await context.cookies();
  }
  return page;
}

async function catalogue(page: Page): Promise<void> {
  await page.goto('/catalogue');
  await page.getByLabel('Vendor', { exact: true }).selectOption({ label: VENDOR });
}

describe('the catalogue', () => {
  test('narrows while one types, keeps it in the address, and goes back', async () => {
    const page = await designer();
    await catalogue(page);
    await page.getByText('3 of', { exact: false }).first().waitFor();
    await page.getByLabel('Words or part number').fill('burbot40');
    await page.getByText('1 of', { exact: false }).first().waitFor();
    expect(await parts(page)).toEqual(['Burbot 40-A']);
    expect(param(page, 'q')).toBe('burbot40');
    await page.reload();
    expect(await page.getByLabel('Words or part number').inputValue()).toBe('burbot40');
    expect(await parts(page)).toEqual(['Burbot 40-A']);
    await page.getByRole('link', { name: 'Clear the filters' }).click();
    await page.waitForURL((url) => url.search === '');
    await page.goBack();
    await page.waitForURL((url) => url.searchParams.get('q') === 'burbot40');
    await page.getByText('1 of', { exact: false }).first().waitFor();
    expect(await page.getByLabel('Words or part number').inputValue()).toBe('burbot40');
  });

  test('sorts by its headings, and says by which', async () => {
    const page = await designer();
    await catalogue(page);
    await page.waitForURL((url) => url.searchParams.has('vendor'));
    await page.getByRole('link', { name: /^Qmax/ }).click();
    await page.waitForURL((url) => url.searchParams.get('sort') === 'qmax');
    await page.getByRole('columnheader', { name: /^Qmax/ }).and(page.locator('[aria-sort="descending"]')).waitFor();
    await expect.poll(() => parts(page)).toEqual(['Tench 62', 'Burbot 40-A', 'Loach 20']);
    await page.getByRole('link', { name: /^Qmax/ }).click();
    await expect.poll(() => parts(page)).toEqual(['Loach 20', 'Burbot 40-A', 'Tench 62']);
    expect(await page.locator('[aria-sort]').count()).toBe(1);
  });

  test('never lets a module through silently whose sheet does not state what is asked', async () => {
    const page = await designer();
    await catalogue(page);
    await page.getByLabel('Plate side, from and to to in mm').fill('100');
    await page.getByText('1 more whose sheet does not state what is filtered by.').waitFor();
    await expect.poll(() => parts(page)).toEqual(['Burbot 40-A', 'Tench 62']);
    await page.getByRole('link', { name: 'Show them too' }).click();
    await expect.poll(() => parts(page)).toEqual(['Burbot 40-A', 'Loach 20', 'Tench 62']);
  });

  test('says how to mend a number that is none, and keeps the rest', async () => {
    const page = await designer();
    await catalogue(page);
    await page.getByLabel('Qmax, from and to from in W').fill('a lot');
    await page.getByText('is not a number: type digits, such as 2.5.').waitFor();
    await page.reload();
    expect(await page.title()).toMatch(/^Error: /);
    expect(await parts(page)).toHaveLength(3);
  });

  test('works without a script: filters by its button, sorts by its links', async () => {
    const page = await designer({ script: false });
    await catalogue(page);
    await page.getByRole('button', { name: 'Filter' }).click();
    expect(await parts(page)).toEqual(['Burbot 40-A', 'Loach 20', 'Tench 62']);
    await page.getByRole('link', { name: /^Qmax/ }).click();
    expect(await parts(page)).toEqual(['Tench 62', 'Burbot 40-A', 'Loach 20']);
    await page.getByLabel('Words or part number').fill('loach');
    await page.getByRole('button', { name: 'Filter' }).click();
    expect(await parts(page)).toEqual(['Loach 20']);
    expect(param(page, 'sort')).toBe('qmax');
  });
});

describe('a module', () => {
  test('shows its curves at any hot side, by typing, with the side in the address', async () => {
    const page = await designer();
    await page.goto(`/modules/${plain}`);
    await page.getByText('as the sheet draws it').waitFor();
    await page.getByLabel('hot side in °C').fill('33,5');
    await page.getByText('the sheet draws 27').waitFor();
    expect(param(page, 'hot')).toBe('33,5');
    await page.getByRole('figure', { name: 'Heat pumped with the hot side at 33.5' }).waitFor();
    await page.getByRole('link', { name: 'COP' }).click();
    await page.getByRole('figure', { name: 'COP with the hot side at 33.5' }).waitFor();
    await page.goBack();
    await page.getByRole('figure', { name: 'Heat pumped with the hot side at 33.5' }).waitFor();
    await page.getByLabel('hot side in °C').fill('90');
    await page.getByText('where the model holds').waitFor();
  });

  test('gives its constants with uncertainty, evidence and history without a script', async () => {
    const page = await designer({ script: false });
    await page.goto(`/modules/${plain}?hot=50&show=voltage`);
    expect(await page.getByRole('heading', { level: 1 }).textContent()).toBe('Burbot 40-A');
    await page.getByRole('figure', { name: 'Voltage with the hot side at 50' }).waitFor();
    const model = page.getByRole('region', { name: /^Model, (effective over this sheet|at 27.°C)$/ });
    expect(plainSpaces(await model.textContent())).toMatch(/Seebeck coefficient α\s*0\.0\d+\(\d+\) V\/K/);
    const evidence = page.getByRole('region', { name: 'Evidence' });
    expect(await evidence.textContent()).toMatch(/QC-7, rev\. B[\s\S]*Ilse Marrow[\s\S]*Soren Quill/);
    await expect.poll(() => evidence.getByRole('img').evaluate((image) => (image as HTMLImageElement).naturalWidth)).toBeGreaterThan(100);
    expect(await page.getByRole('region', { name: 'History' }).first().textContent()).toContain('approved');
    await page.getByLabel('hot side in °C').fill('45');
    await page.getByLabel('hot side in °C').press('Enter');
    await page.getByRole('figure', { name: 'Voltage with the hot side at 45' }).waitFor();
  });

  test('puts printed ratings beside what the model implies', async () => {
    const page = await designer();
    await page.goto(`/modules/${plain}`);
    const row = page.getByRole('region', { name: 'Ratings' }).getByRole('row', { name: /printed/ });
    expect(plainSpaces(await row.textContent())).toMatch(/6.*15.*40.*60.*Imax of the largest ΔT, typical, in air, ± 10 %/);
  });

  test('leads into a duty that it does', async () => {
    const page = await designer();
    await page.goto(`/modules/${plain}`);
    await page.getByRole('link', { name: 'Try in a duty' }).click();
    await page.waitForURL((url) => url.pathname === '/duty');
    expect(param(page, 'module')).toBe(String(plain));
    await page
      .getByRole('region', { name: 'Modules that do it' })
      .getByRole('row', { name: /Burbot 40-A/ })
      .waitFor();
    await page
      .getByText('The hot side can burn', { exact: false })
      .or(page.getByText('the hot side can burn', { exact: false }))
      .first()
      .waitFor();
  });
});

/** Heat, cold face, hot face. */
async function fillDuty(page: Page, values: Readonly<Record<string, string>>): Promise<void> {
  for (const [label, value] of Object.entries(values)) await page.getByLabel(label).fill(value);
}
const DUTY = { 'Heat to pump in W': '5', 'Cold face in °C': '10', 'Hot face in °C': '30' };
const matchRow = (page: Page, part: RegExp) => page.getByRole('region', { name: 'Modules that do it' }).getByRole('row', { name: part });
const missRow = (page: Page, part: RegExp) =>
  page.getByRole('region', { name: 'Modules that come closest' }).getByRole('row', { name: part });

describe('the duty search', () => {
  test('answers while one types, best COP first, with the duty in the address', async () => {
    const page = await designer();
    await page.goto('/duty');
    await page.getByRole('heading', { name: 'What has to be cooled, and from where to where?' }).waitFor();
    await fillDuty(page, DUTY);
    // α 0.05 V/K, R 2.2 Ω, K 0.4 W/K: I = (14.1575 − √(14.1575² − 4.4 · 13))/2.2 = 0.9952 A, V = 1 + 2.1894 V
    await matchRow(page, /Burbot 40-A/).waitFor();
    expect(plainSpaces(await matchRow(page, /Burbot 40-A/).textContent())).toContain('3.19');
    expect(Object.fromEntries(addressOf(page).searchParams)).toEqual({ heat: '5', cold: '10', hot: '30' });
    await page.reload();
    expect(await page.getByLabel('Heat to pump in W').inputValue()).toBe('5');
    await matchRow(page, /Burbot 40-A/).waitFor();
  });

  test('says why a module fails, with numbers', async () => {
    const page = await designer();
    await page.goto('/duty?heat=5&cold=10&hot=30&voltage=3');
    expect(plainSpaces(await missRow(page, /Burbot 40-A/).textContent())).toContain('needs 3.19 V, the limit is 3 V');
    await page.getByLabel('Voltage at most in V').fill('');
    await matchRow(page, /Burbot 40-A/).waitFor();
    // the most that 0.025 V/K, 1.1 Ω and 0.2 W/K pump over 20 K is 7.07875²/2.2 − 4 = 18.78 W
    await page.getByLabel('Heat to pump in W').fill('30');
    await expect.poll(async () => plainSpaces(await missRow(page, /Loach 20/).textContent())).toContain('reaches 18.8 W at 6.44 A');
  });

  test('holds the cold face against the dew point', async () => {
    const page = await designer();
    await page.goto('/duty?heat=5&cold=10&hot=30');
    await page.getByText('Give the air and its humidity').waitFor();
    await page.getByLabel('Air in °C').fill('30');
    await page.getByLabel('Relative humidity in %').fill('60');
    await page.getByText('Water will form.').waitFor();
    // 30 °C and 60 %: dew point 21.39 °C
    expect(plainSpaces(await page.getByText('Water will form.').locator('..').textContent())).toContain(
      '11.4 K below the dew point of 21.4 °C',
    );
    await page.getByLabel('Cold face in °C').fill('26');
    await page.getByText('It stays dry.', { exact: true }).waitFor();
  });

  test('complains about a field only when one has left it, and not by moving the button away', async () => {
    const page = await designer();
    await page.goto('/duty?heat=5&cold=10&hot=30');
    const current = page.getByLabel('Current at most in A');
    await current.fill('much');
    await page.waitForURL((url) => url.searchParams.get('current') === 'much');
    expect(await page.getByText('is not a number').count()).toBe(0);
    await page.getByRole('button', { name: 'Find modules' }).click();
    await page.getByText('is not a number').waitFor();
    await current.fill('4');
    await expect.poll(() => page.getByText('is not a number').count()).toBe(0);
    await matchRow(page, /Burbot 40-A/).waitFor();
  });

  test('gives the same answer without a script', async () => {
    const page = await designer({ script: false });
    await page.goto('/duty');
    await fillDuty(page, DUTY);
    await page.getByRole('button', { name: 'Find modules' }).click();
    expect(plainSpaces(await matchRow(page, /Burbot 40-A/).textContent())).toContain('3.19');
    expect(await page.getByRole('img', { name: /cold face 10\.0.*hot face 30\.0/ }).count()).toBe(1);
    await page.getByText('Never run it without a working heat sink', { exact: false }).waitFor();
  });

  test('marks the duty in the curves of a module it leads to', async () => {
    const page = await designer();
    await page.goto('/duty?heat=5&cold=10&hot=30');
    await matchRow(page, /Burbot 40-A/)
      .getByRole('link')
      .click();
    await page.waitForURL((url) => url.pathname === `/modules/${plain}`);
    expect(await page.getByRole('img', { name: /duty: 5.W at 20.K/ }).count()).toBe(1);
  });
});

describe('catalogue, module and duty', () => {
  const PAGES = ['/catalogue', '/duty', '/duty?heat=5&cold=10&hot=30&voltage=3.5&air=30&humidity=60'];

  test.each([false, true])('meet WCAG 2.2 AA as far as a program can tell, dark: %s', async (dark) => {
    const page = await designer({ dark });
    for (const path of [...PAGES, `/modules/${plain}?heat=5&cold=10&hot=30`]) {
      await page.goto(path, { waitUntil: 'networkidle' });
      expect(await axeFindings(page), path).toEqual([]);
    }
  });

  test('fit a phone without scrolling sideways', async () => {
    const page = await designer({ width: 390, height: 844 });
    for (const path of [...PAGES, `/modules/${plain}`]) {
      await page.goto(path, { waitUntil: 'networkidle' });
      expect(await overflow(page), path).toBeLessThanOrEqual(0);
    }
  });

  test('take no more than 130 kB of script', async () => {
    const page = await designer();
    for (const path of [...PAGES.slice(0, 2), `/modules/${plain}`]) {
      const scripts = new Map<string, Promise<number>>();
      page.on('response', (answer) => {
        if (answer.url().endsWith('.js'))
          scripts.set(
            answer.url(),
            answer.body().then(async (body) => (await import('node:zlib')).gzipSync(body).length),
          );
      });
      await page.goto(path, { waitUntil: 'networkidle' });
      const bytes = (await Promise.all(scripts.values())).reduce((sum, size) => sum + size, 0);
      expect(bytes, path).toBeGreaterThan(40_000);
      expect(bytes, path).toBeLessThan(130_000);
      page.removeAllListeners('response');
    }
  });

  test('are not for everybody: no duty for an administrator, sign-in first for nobody', async () => {
    const { page } = await visit();
    await page.goto('/catalogue?q=burbot');
    expect(addressOf(page).pathname).toBe('/sign-in');
    await signInAs(page, 'administrator');
    const answer = await page.goto('/duty?heat=5&cold=10&hot=30');
    expect(answer?.status()).toBe(403);
    await page.goto(`/modules/${plain}`);
    expect(await page.getByRole('link', { name: 'Try in a duty' }).count()).toBe(0);
  });
});
