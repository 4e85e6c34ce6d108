import { readFileSync } from 'node:fs';
import path from 'node:path';
import type { Page } from 'playwright-core';
import { inject } from 'vitest';
import type { ModuleView, ReadingView } from '@/lib/contracts';
import { FIT_MARGIN, fitViewport, toStage, type BenchDocument } from '@/lib/editor';
import type { Px } from '@/lib/geometry';
import { addSheet, open } from './arrange';

const base = inject('baseUrl');
const sameSite = { Origin: base, 'Sec-Fetch-Site': 'same-origin' };

/** Every drawn chart of the tests is this large, px. */
export const DRAWN = { width: 1000, height: 720 } as const;
export const drawing = (name: string) => path.resolve('tests/fixtures/charts', name);

type Station = 'Chart' | 'Frame' | 'Curves' | 'Model' | 'Hand in';

/** A reading of drawn charts that nothing has been read in yet, made past the screens by whoever has entered; the address of its bench. */
export async function newReading(page: Page, partNumber: string, ...pictures: string[]): Promise<string> {
  const request = page.context().request;
  const sheet = await addSheet(page, { vendor: 'Wheatear Thermal', number: partNumber });
  for (const name of pictures) {
    const file = { name, mimeType: 'image/png', buffer: readFileSync(drawing(name)) };
    const sent = await request.post(`${base}/api/sheets/${sheet.id}/pages`, { multipart: { file }, headers: sameSite });
    if (!sent.ok()) throw new Error(`${name} could not be uploaded: ${await sent.text()}`);
  }
  const stated = {
    stages: null,
    couples: null,
    coldPlateMm: null,
    hotPlateMm: null,
    heightMm: null,
    maxTemperatureC: null,
    leadsOhm: null,
  };
  const data = {
    ...stated,
    vendor: sheet.vendor,
    partNumber,
    variant: '',
    sealing: null,
    acResistanceOhm: null,
    acResistanceAtC: null,
    ratings: [],
  };
  const module = (await (await request.post(`${base}/api/modules`, { data, headers: sameSite })).json()) as ModuleView;
  const started = await request.post(`${base}/api/sheets/${sheet.id}/readings`, { data: { moduleId: module.id }, headers: sameSite });
  return `/bench/${((await started.json()) as { id: number }).id}`;
}

const api = (address: string) => `${base}/api/readings/${address.split('/').at(-1)}`;

/** The reading as the server has it. */
export const stored = async (page: Page, address: string): Promise<ReadingView> =>
  (await (await page.context().request.get(api(address))).json()) as ReadingView;

/** Saves a draft past the screens, as another tab would. */
export async function saveElsewhere(page: Page, address: string, change: (document: BenchDocument) => BenchDocument): Promise<void> {
  const { version, document } = await stored(page, address);
  const headers = { ...sameSite, 'If-Match': `"${version}"` };
  const saved = await page.context().request.put(api(address), { data: { document: change(document) }, headers });
  if (!saved.ok()) throw new Error(`The draft could not be saved: ${await saved.text()}`);
}

/** The bench as a person uses it: by what is seen, and by pixels of the picture while it is fitted. */
export function benchOf(page: Page) {
  const canvas = page.getByRole('group', { name: /^Picture/ });
  /** Where a pixel of the fitted picture stands on the screen. */
  const onScreen = async (px: Px): Promise<Px> => {
    const box = await canvas.boundingBox();
    if (!box) throw new Error('The picture is not there.');
    const [x, y] = toStage(fitViewport(DRAWN, box), px);
    return [box.x + x, box.y + y];
  };
  const rows = page
    .getByRole('grid', { name: /^Points of/ })
    .locator('tbody')
    .getByRole('row');
  return {
    canvas,
    rows,
    margin: FIT_MARGIN,
    onScreen,
    open: async (address: string) => {
      await open(page, address);
      await canvas.waitFor();
    },
    station: (name: Station) =>
      page
        .getByRole('navigation', { name: 'Stations' })
        .getByRole('button', { name: new RegExp(`^\\W*\\d?\\W*${name}`) })
        .click(),
    fit: () => page.getByRole('button', { name: 'Fit', exact: true }).click(),
    click: async (px: Px) => page.mouse.click(...(await onScreen(px))),
    tap: async (px: Px) => page.touchscreen.tap(...(await onScreen(px))),
    press: async (px: Px) => {
      await page.mouse.move(...(await onScreen(px)));
      await page.mouse.down();
    },
    moveTo: async (px: Px) => page.mouse.move(...(await onScreen(px)), { steps: 4 }),
    /** Number, values and pixels of the points in the table, as text. */
    points: async (): Promise<{ x: string; y: string; px: Px; leftOut: boolean }[]> =>
      (await rows.all()).length === 0
        ? []
        : await rows.evaluateAll((list) =>
            list.map((row) => {
              const cells = [...row.querySelectorAll('td')].map((cell) => cell.innerText);
              return { x: cells[1]!, y: cells[2]!, px: [Number(cells[3]), Number(cells[4])] as [number, number], leftOut: cells[5] !== '' };
            }),
          ),
    undoName: () => page.getByRole('button', { name: /^Undo/ }).getAttribute('aria-label'),
    saved: () => page.getByText(/^saved \d\d:\d\d$/).waitFor(),
    saving: () => page.getByText('saving', { exact: true }).waitFor(),
    readout: async () => (await page.locator('.bench-readout').innerText()).replace(/\s+/g, ' '),
  };
}
export type BenchHand = ReturnType<typeof benchOf>;
