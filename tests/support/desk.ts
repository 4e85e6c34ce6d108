import type { Browser, BrowserContext, Page } from 'playwright-core';
import { afterAll, afterEach, beforeAll, expect, inject } from 'vitest';
import { apply, emptyChart, type BenchDocument, type BenchPicture, type Command } from '@/lib/editor';
import type { Px } from '@/lib/geometry';
import { enterAs } from './arrange';
import { benchOf, newReading, saveElsewhere, stored, type BenchHand } from './bench';
import { launch, listenTo } from './browser';

/** The points of the one curve that every reading of the desk begins with, px. */
export const POINTS: readonly Px[] = [
  [150, 515],
  [250, 570],
  [350, 620],
];

/** Heat over ΔT at 27 °C, framed by three corners, with one curve of three points. */
function drawn(document: BenchDocument, picture: BenchPicture): BenchDocument {
  const marks = [
    [62, 661.7, 0, 0],
    [976.1, 661.7, 70, null],
    [62, 35.3, null, 35],
  ] as const;
  const commands: Command[] = [
    { type: 'addChart', chart: emptyChart('c1', picture) },
    { type: 'setKind', chart: 'c1', kind: 'heat-deltaT' },
    { type: 'setSide', chart: 'c1', to: { celsius: 27 } },
    ...marks.map(([x, y, a, b], at): Command => ({ type: 'addMark', chart: 'c1', mark: { id: `m${at + 1}`, px: [x, y], x: a, y: b } })),
    { type: 'addCurve', chart: 'c1', curve: { id: 'k1', value: 0.7, by: 'hand', points: POINTS, omitted: [] } },
  ];
  return commands.reduce(apply, document);
}

export interface AtBench {
  readonly page: Page;
  readonly context: BrowserContext;
  readonly bench: BenchHand;
  readonly address: string;
}

/** A reading with one chart, in a window of whoever has entered, at the curves station. */
export async function atCurves(page: Page, partNumber: string): Promise<AtBench> {
  const address = await newReading(page, partNumber, 'd01.png');
  const { sheets } = await stored(page, address);
  await saveElsewhere(page, address, (document) => drawn(document, sheets[0]!.pages[0]!.picture));
  const bench = benchOf(page);
  await bench.open(address);
  await bench.station('Curves');
  await bench.fit();
  await bench.rows.first().waitFor();
  return { page, context: page.context(), bench, address };
}

/**
 * An engineer who stays: one window for all tests of a file, so that the bench's script is fetched and compiled once.
 * Each test gets a page and a reading of its own; what a page complains about fails the test.
 */
export function useDesk(options: { width?: number; height?: number; touch?: boolean } = {}) {
  let browser: Browser;
  let context: BrowserContext;
  let complaints: string[] = [];
  beforeAll(async () => {
    browser = await launch();
    context = await browser.newContext({
      baseURL: inject('baseUrl'),
      viewport: { width: options.width ?? 1440, height: options.height ?? 900 },
      hasTouch: options.touch ?? false,
    });
  });
  afterAll(() => browser.close());
  afterEach(async () => {
    await Promise.all(context.pages().map((page) => page.close()));
    const found = complaints;
    complaints = [];
    expect(found).toEqual([]);
  });
  const newPage = async (): Promise<Page> => {
    const page = await context.newPage();
    if ((await context.cookies()).length === 0) await enterAs(page, 'engineer');
    listenTo(page, (complaint) => complaints.push(complaint));
    return page;
  };
  return { newPage, atCurves: async (partNumber: string) => atCurves(await newPage(), partNumber) };
}
