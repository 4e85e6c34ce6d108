import { readFileSync } from 'node:fs';
import type { Page } from 'playwright-core';
import { describe, expect, test } from 'vitest';
import { apply } from '@/lib/editor';
import type { Px } from '@/lib/geometry';
import { enterAs, listens } from '../support/arrange';
import { axeFindings } from '../support/axe';
import { benchOf, newReading, saveElsewhere, stored } from '../support/bench';
import { useBrowser } from '../support/browser';
import { atCurves, POINTS, useDesk } from '../support/desk';

const { visit } = useBrowser();

const desk = useDesk();
const phone = useDesk({ width: 390, height: 844, touch: true });

/** An engineer in a window of their own. */
const stranger = async () => {
  const visitor = await visit();
  await enterAs(visitor.page, 'engineer');
  return visitor;
};

const isNear = ([x, y]: Px, [a, b]: Px, within = 0.6) => Math.hypot(x - a, y - b) <= within;
const place = async (bench: ReturnType<typeof benchOf>, at: number): Promise<Px> => (await bench.points())[at]!.px;

describe('points on the picture', () => {
  test('a click in any order places points in order along the line, where they were clicked', async () => {
    const { bench } = await desk.atCurves('order');
    await bench.click([300, 595]);
    await bench.click([100, 490]);
    const at = (await bench.points()).map(({ px }) => px);
    expect(at).toHaveLength(5);
    expect(at.map(([x]) => x)).toEqual(at.map(([x]) => x).toSorted((a, b) => a - b));
    expect([isNear(at[0]!, [100, 490]), isNear(at[3]!, [300, 595])]).toEqual([true, true]);
  });

  test('a drag moves a point as one step, and Esc gives a drag up without a trace', async () => {
    const { page, bench } = await desk.atCurves('drag');
    await bench.press(POINTS[1]!);
    await bench.moveTo([280, 540]);
    await page.keyboard.press('Escape');
    await bench.moveTo([320, 500]);
    await page.mouse.up();
    expect([await place(bench, 1), await bench.undoName()]).toEqual([POINTS[1], 'Undo']);
    await bench.press(POINTS[1]!);
    await bench.moveTo([280, 540]);
    await page.mouse.up();
    expect(isNear(await place(bench, 1), [280, 540])).toBe(true);
    expect(await bench.undoName()).toBe('Undo move point');
    await page.keyboard.press('Control+z');
    expect([await place(bench, 1), await bench.undoName()]).toEqual([POINTS[1], 'Undo']);
    await page.keyboard.press('Control+y');
    expect(isNear(await place(bench, 1), [280, 540])).toBe(true);
  });

  test('a press that is let go outside the picture places nothing', async () => {
    const { page, bench } = await desk.atCurves('abort');
    await bench.press([500, 300]);
    await page.mouse.move(700, 20);
    await page.mouse.up();
    expect(await bench.points()).toHaveLength(3);
  });

  test('arrow keys nudge by 1, 10 and 0.1 pixels, and a run of them is one step', async () => {
    const { page, bench } = await desk.atCurves('nudge');
    await bench.rows.nth(1).click();
    await bench.canvas.focus();
    for (const key of ['ArrowRight', 'ArrowRight', 'Shift+ArrowUp', 'Alt+ArrowLeft']) await page.keyboard.press(key);
    expect(await place(bench, 1)).toEqual([251.9, 560]);
    await page.keyboard.press('Control+z');
    expect([await place(bench, 1), await bench.undoName()]).toEqual([POINTS[1], 'Undo']);
  });

  test('without dragging: a point is picked in the table and moved by a click, by buttons, and by numbers in pixels and in units', async () => {
    const { page, bench } = await desk.atCurves('clicks');
    await bench.rows.nth(1).click();
    await page.getByRole('button', { name: 'Move by a click' }).click();
    await bench.click([260, 560]);
    expect(isNear(await place(bench, 1), [260, 560])).toBe(true);
    await page.getByLabel('x / px').fill('270');
    await page.keyboard.press('Enter');
    await page.getByRole('button', { name: 'Move down by 1 px' }).click();
    const [x, y] = await place(bench, 1);
    expect([x, Math.abs(y - 561) < 0.6]).toEqual([270, true]);
    await page.getByLabel('Qc / W', { exact: true }).fill('7,5');
    await page.keyboard.press('Enter');
    expect((await bench.points())[1]!.y).toBe('7.50');
  });

  test('a point is left out of the fit and used again, and removed and brought back', async () => {
    const { page, bench } = await desk.atCurves('out');
    await bench.rows.nth(2).click();
    await page.getByText('Leave this point out of the fit').click();
    expect((await bench.points()).map(({ leftOut }) => leftOut)).toEqual([false, false, true]);
    await page.getByText('Leave this point out of the fit').click();
    await page.getByRole('button', { name: 'Remove', exact: true }).click();
    expect(await bench.points()).toHaveLength(2);
    await page.getByRole('button', { name: 'Undo remove point' }).click();
    expect((await bench.points()).map(({ px }) => px)).toEqual(POINTS);
  });
});

describe('by the keyboard alone', () => {
  test('points are placed, stepped through, edited and removed, and Tab leaves the picture', async () => {
    const { page, bench } = await desk.atCurves('keys');
    await bench.canvas.focus();
    await page.keyboard.press('Shift+ArrowRight');
    await page.keyboard.press('Enter');
    await page.getByRole('heading', { name: 'Point 4 of the 0.7 A curve' }).waitFor();
    await page.keyboard.press('Enter');
    await page.keyboard.type('450');
    await page.keyboard.press('Tab');
    await page.keyboard.type('640.5');
    await page.keyboard.press('Enter');
    expect(await place(bench, 3)).toEqual([450, 640.5]);
    await bench.canvas.focus();
    await page.keyboard.press('[');
    await page.getByRole('heading', { name: 'Point 3 of' }).waitFor();
    await page.keyboard.press('Delete');
    expect((await bench.points()).map(({ px }) => px)).toEqual([POINTS[0], POINTS[1], [450, 640.5]]);
    await page.keyboard.press('Insert');
    await page.keyboard.press('?');
    await page.getByRole('dialog', { name: 'Keys' }).waitFor();
    await page.keyboard.press('Escape');
    await page.keyboard.press('Tab');
    expect(await bench.canvas.evaluate((element) => element.contains(document.activeElement))).toBe(false);
  });

  test('letters in a text field stay letters', async () => {
    const { page, bench } = await desk.atCurves('letters');
    await bench.station('Chart');
    const name = page.getByRole('textbox', { name: 'Name', exact: true });
    await name.fill('');
    await page.keyboard.type('pv?0+');
    expect(await name.inputValue()).toBe('pv?0+');
    expect(await page.getByRole('dialog').count()).toBe(0);
  });

  test('rows of the table are walked by arrows, and the point of the row is picked on the picture', async () => {
    const { page, bench } = await desk.atCurves('rows');
    await bench.rows.first().focus();
    await page.keyboard.press('ArrowDown');
    await page.getByRole('heading', { name: 'Point 2 of' }).waitFor();
    await page.keyboard.press('End');
    expect(await bench.rows.nth(2).getAttribute('aria-selected')).toBe('true');
    expect(await bench.rows.nth(2).evaluate((row) => row === document.activeElement)).toBe(true);
  });
});

describe('the view', () => {
  test('the wheel zooms about the pointer, Space pans, and 0 shows the whole picture again', async () => {
    const { page, bench } = await desk.atCurves('zoom');
    await page.mouse.move(...(await bench.onScreen([500, 300])));
    const pixel = async () =>
      /pixel ([\d.]+), ([\d.]+)/
        .exec(await bench.readout())!
        .slice(1)
        .map(Number) as unknown as Px;
    await expect.poll(async () => isNear(await pixel(), [500, 300], 1)).toBe(true);
    const before = await pixel();
    await page.mouse.wheel(0, -600);
    await expect.poll(async () => Number(/(\d+) ?%/.exec(await bench.readout())![1])).toBeGreaterThan(150);
    expect(isNear(await pixel(), before, 0.2)).toBe(true);
    await bench.canvas.focus();
    await page.keyboard.down(' ');
    await page.mouse.down();
    await page.mouse.move(...((await bench.onScreen([500, 300])).map((c) => c + 80) as [number, number]), { steps: 3 });
    await page.mouse.up();
    await page.keyboard.up(' ');
    expect(await bench.points()).toHaveLength(3);
    expect(isNear(await pixel(), before, 1)).toBe(true);
    await page.keyboard.press('0');
    await bench.click([200, 540]);
    expect((await bench.points()).some(({ px }) => isNear(px, [200, 540]))).toBe(true);
  });

  test('the loupe never covers what is pointed at', async () => {
    const { page, bench } = await desk.atCurves('loupe');
    for (const px of [
      [960, 40],
      [900, 120],
      [760, 60],
      [60, 60],
      [980, 700],
    ] as const) {
      const [x, y] = await bench.onScreen(px);
      await page.mouse.move(x, y);
      const loupe = page.locator('.bench-loupe');
      await loupe.waitFor();
      await expect
        .poll(async () => {
          const box = (await loupe.boundingBox())!;
          return x < box.x || x > box.x + box.width || y < box.y || y > box.y + box.height;
        })
        .toBe(true);
    }
  });
});

describe('at 390 pixels, by touch', () => {
  test('marks and points are placed by taps and typed, and nothing scrolls sideways', async () => {
    const page = await phone.newPage();
    const bench = benchOf(page);
    await bench.open(await newReading(page, 'phone', 'd01.png'));
    await page.getByRole('complementary', { name: 'Station' }).getByRole('button', { name: /d01/ }).tap();
    await page.getByLabel('Kind of chart').selectOption('Heat over temperature difference');
    await page.getByLabel('Temperature of the hot side').fill('27');
    await bench.station('Frame');
    await bench.fit();
    for (const [at, [px, x, y]] of (
      [
        [[62, 661.7], '0', '0'],
        [[976, 35.3], '70', '35'],
      ] as const
    ).entries()) {
      await bench.canvas.scrollIntoViewIfNeeded();
      await bench.tap(px);
      await page.getByLabel(`Mark ${at + 1}: ΔT / K`).fill(x);
      await page.getByLabel(`Mark ${at + 1}: Qc / W`).fill(y);
      await page.keyboard.press('Enter');
    }
    await page.getByText('The frame stands.').waitFor();
    await bench.station('Curves');
    await page.getByRole('button', { name: 'Add a curve' }).tap();
    await page.getByLabel(/^Value of curve 1/).fill('0.7');
    await bench.canvas.scrollIntoViewIfNeeded();
    for (const px of POINTS) await bench.tap(px);
    const found = (await bench.points()).map(({ px }) => px);
    expect(found.map((px, at) => isNear(px, POINTS[at]!, 2))).toEqual([true, true, true]);
    expect(await page.evaluate(() => document.documentElement.scrollWidth - innerWidth)).toBe(0);
    await page.getByText('All curves of this chart are ready for the model.').waitFor();
  });

  test('targets are large: no button of the bench is smaller than 24 pixels, and tools are 44', async () => {
    const { page, bench } = await phone.atCurves('targets');
    await bench.rows.first().tap();
    const sizes = await page.locator('.bench button, .bench select, .bench input[type=text]').evaluateAll((list) =>
      list
        .filter((element) => element.checkVisibility())
        .map(
          (element) =>
            ({ name: element.textContent || element.getAttribute('aria-label'), ...element.getBoundingClientRect().toJSON() }) as {
              name: string;
              width: number;
              height: number;
            },
        ),
    );
    expect(sizes.filter(({ width, height }) => width < 24 || height < 24)).toEqual([]);
    const tools = await page
      .getByRole('toolbar')
      .getByRole('button')
      .evaluateAll((list) => list.map((tool) => tool.getBoundingClientRect().height));
    expect(Math.min(...tools)).toBeGreaterThanOrEqual(44);
  });
});

describe('saving', () => {
  test('a change is saved by itself, survives a new load, and the page warns before it goes only until then', async () => {
    const { page, bench } = await desk.atCurves('saved');
    await bench.click([300, 595]);
    await bench.saving();
    let warned = false;
    page.once('dialog', (dialog) => {
      warned = true;
      void dialog.dismiss();
    });
    await page.close({ runBeforeUnload: true });
    await expect.poll(() => warned).toBe(true);
    await bench.saved();
    await page.reload();
    await listens(page);
    await bench.station('Curves');
    expect(await bench.points()).toHaveLength(4);
  });

  const race = async (partNumber: string) => {
    const at = await desk.atCurves(partNumber);
    await saveElsewhere(at.page, at.address, (document) => apply(document, { type: 'setTitle', chart: 'c1', title: 'Renamed elsewhere' }));
    await at.bench.click([300, 595]);
    const dialog = at.page.getByRole('alertdialog', { name: 'This reading was changed elsewhere' });
    await dialog.getByText('3 marks, 1 curve, 4 points').waitFor();
    await dialog.getByText('3 marks, 1 curve, 3 points').waitFor();
    return { ...at, dialog };
  };

  test('of two versions mine is kept when I say so', async () => {
    const { page, bench, address, dialog } = await race('race-mine');
    await dialog.getByRole('button', { name: 'Keep mine' }).click();
    await bench.saved();
    const [chart] = (await stored(page, address)).document.charts;
    expect([chart!.title, chart!.curves[0]!.points.length]).toEqual(['', 4]);
  });

  test('of two versions theirs is taken when I say so, and undo brings mine back', async () => {
    const { page, bench, address, dialog } = await race('race-theirs');
    await dialog.getByRole('button', { name: 'Take theirs' }).click();
    await bench.saved();
    expect(await bench.points()).toHaveLength(3);
    await page.getByRole('button', { name: 'Undo take the other version' }).click();
    expect(await bench.points()).toHaveLength(4);
    await bench.saved();
    expect((await stored(page, address)).document.charts[0]!.title).toBe('');
  });

  test('work of an expired session is offered after signing in again, and taken up', async () => {
    const { page, context, bench, address } = await desk.atCurves('expired');
    await context.clearCookies();
    await bench.click([300, 595]);
    await page.getByText('you are signed out').waitFor();
    page.on('dialog', (dialog) => void dialog.accept());
    await enterAs(page, 'engineer');
    await page.goto(address);
    const offer = page.getByRole('alertdialog', { name: 'Work that was not saved' });
    await offer.getByText('3 marks, 1 curve, 4 points').waitFor();
    await offer.getByRole('button', { name: 'Take it up again' }).click();
    await bench.saved();
    expect((await stored(page, address)).document.charts[0]!.curves[0]!.points).toHaveLength(4);
    await page.reload();
    await listens(page);
    await bench.canvas.waitFor();
    expect(await page.getByRole('alertdialog').count()).toBe(0);
  });

  test('signing in again in another tab is enough: the work is saved from here', async () => {
    const { page, context, bench, address } = await desk.atCurves('other-tab');
    await context.clearCookies();
    await bench.click([300, 595]);
    await page.getByText('you are signed out').waitFor();
    await enterAs(page, 'engineer');
    await page.getByRole('button', { name: 'Save now' }).click();
    await bench.saved();
    expect((await stored(page, address)).document.charts[0]!.curves[0]!.points).toHaveLength(4);
  });

  test('nothing of a person stays in the browser after signing out', async () => {
    const { page, context, bench } = await atCurves((await stranger()).page, 'gone');
    await context.route('**/api/readings/*', (route) =>
      route.request().method() === 'PUT' ? route.fulfill({ status: 429 }) : route.continue(),
    );
    await bench.click([300, 595]);
    await page.getByText(/^not saved: /).waitFor();
    const names = () => page.evaluate(async () => (await indexedDB.databases()).map(({ name }) => name));
    expect(await names()).toEqual([expect.stringMatching(/^couplet-unsaved-/)]);
    page.on('dialog', (dialog) => void dialog.accept());
    await page
      .getByText(/Ilse Marrow/)
      .first()
      .click();
    await page
      .getByRole('button', { name: 'Sign out' })
      .or(page.getByRole('link', { name: 'Sign out' }))
      .click();
    await page.waitForURL(/sign-(in|out)/);
    await expect.poll(names).toEqual([]);
  });
});

describe('documents in and out', () => {
  const download = async (page: Page, item: string) => {
    const coming = page.waitForEvent('download');
    await page.getByRole('button', { name: /^File/ }).click();
    await page.getByRole('menuitem', { name: item }).click();
    return JSON.parse(readFileSync(await (await coming).path(), 'utf8')) as {
      format: string;
      charts: { image: string; curves: unknown[] }[];
    };
  };

  test('a reading is downloaded, and imported again after everything was removed', async () => {
    const { page, bench } = await desk.atCurves('files');
    const document = await download(page, 'Download reading');
    expect([document.format, document.charts.map(({ image, curves }) => [image, curves.length])]).toEqual([
      'couplet.reading',
      [['d01.png', 1]],
    ]);
    await bench.station('Chart');
    await page.getByRole('button', { name: 'Remove this chart' }).click();
    await page.getByRole('heading', { name: 'Begin with a page' }).waitFor();
    const chooser = page.waitForEvent('filechooser');
    await page.getByRole('button', { name: /^File/ }).click();
    await page.getByRole('menuitem', { name: 'Import reading' }).click();
    await (
      await chooser
    ).setFiles({ name: 'mine.reading.json', mimeType: 'application/json', buffer: Buffer.from(JSON.stringify(document)) });
    await page.getByText('The reading has been imported.').waitFor();
    await bench.station('Curves');
    expect((await bench.points()).map(({ px }) => px)).toEqual(POINTS);
  });

  test('a file that is no reading is refused with a sentence', async () => {
    const { page } = await desk.atCurves('refused');
    const chooser = page.waitForEvent('filechooser');
    await page.getByRole('button', { name: /^File/ }).click();
    await page.getByRole('menuitem', { name: 'Import reading' }).click();
    await (
      await chooser
    ).setFiles({ name: 'x.json', mimeType: 'application/json', buffer: Buffer.from('{"format":"couplet.reading","version":1}') });
    await page.getByText(/^module: /).waitFor();
  });
});

describe('for everybody', () => {
  test.each([
    ['light', false],
    ['dark', true],
  ])('axe finds nothing at any station, %s', async (_name, dark) => {
    const { page, bench } = await desk.atCurves(`axe-${dark}`);
    await page.emulateMedia({ colorScheme: dark ? 'dark' : 'light' });
    await bench.rows.first().click();
    for (const station of ['Curves', 'Chart', 'Frame', 'Model', 'Hand in'] as const) {
      await bench.station(station);
      if (station === 'Model') await page.getByText('add a voltage chart').or(page.getByText('Seebeck coefficient')).first().waitFor();
      expect([station, await axeFindings(page)]).toEqual([station, []]);
    }
  });

  test('what happens is said: a point that is placed, and one that was nudged, once it rests', async () => {
    const { page, bench } = await desk.atCurves('said');
    await bench.click([300, 595]);
    await page.getByText(/^Point 3 of the 0\.7.A curve placed: ΔT/).waitFor({ state: 'attached' });
    for (let press = 0; press < 4; press++) await page.keyboard.press('ArrowLeft');
    await page.getByText(/^Point 3 of the 0\.7.A curve: ΔT.17\.9/).waitFor({ state: 'attached' });
  });

  test('a librarian sees the reading of an engineer and cannot change it', async () => {
    const { address } = await desk.atCurves('seen');
    const { page } = await visit();
    await enterAs(page, 'librarian');
    const bench = benchOf(page);
    await bench.open(address);
    await page.getByText('read only').waitFor();
    await bench.station('Curves');
    await bench.fit();
    await bench.click([300, 595]);
    expect(await bench.points()).toHaveLength(3);
    expect(await page.getByRole('button', { name: /^Undo|^Add a curve/ }).count()).toBe(0);
  });
});
