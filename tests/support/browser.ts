import type { Browser, BrowserContext, Page } from 'playwright-core';
import { afterAll, afterEach, beforeAll, expect, inject } from 'vitest';
import { launch } from './browser-program';

export { launch };

/** Two animation frames: Konva redraws its hit graph on the next one. */
export const settle = (page: Page) =>
  page.evaluate(() => new Promise<void>((done) => requestAnimationFrame(() => requestAnimationFrame(() => done()))));

export interface Visitor {
  readonly page: Page;
  readonly context: BrowserContext;
}

/** Problem answers that a test provokes on purpose show up on the console; everything else there fails the test. */
const EXPECTED = /the server responded with a status of 4\d\d/;

/** Hears what a page complains about on the console, throws, or fetches from elsewhere. */
export function listenTo(page: Page, complain: (complaint: string) => void): void {
  const base = inject('baseUrl');
  page.on('pageerror', (error) => complain(`error on the page: ${error.message}`));
  page.on('console', (message) => {
    if (message.type() === 'error' && !EXPECTED.test(message.text())) complain(`console: ${message.text()}`);
  });
  page.on('request', (request) => {
    if (/^https?:/.test(request.url()) && !request.url().startsWith(base)) complain(`left the site: ${request.url()}`);
  });
}

/**
 * A browser for a test file. `visit` opens a fresh person's window; whatever its pages complain about on the
 * console, throw, or fetch from elsewhere fails the test.
 */
export function useBrowser() {
  let browser: Browser;
  let contexts: BrowserContext[] = [];
  let complaints: string[] = [];
  beforeAll(async () => {
    browser = await launch();
  });
  afterAll(() => browser.close());
  afterEach(async () => {
    await Promise.all(contexts.map((context) => context.close()));
    contexts = [];
    const found = complaints;
    complaints = [];
    expect(found).toEqual([]);
  });
  const base = inject('baseUrl');
  return {
    base,
    async visit(options: { width?: number; height?: number; dark?: boolean; touch?: boolean; script?: boolean } = {}): Promise<Visitor> {
      const context = await browser.newContext({
        baseURL: base,
        viewport: { width: options.width ?? 1440, height: options.height ?? 900 },
        colorScheme: options.dark ? 'dark' : 'light',
        hasTouch: options.touch ?? false,
        javaScriptEnabled: options.script ?? true,
        permissions: ['clipboard-read', 'clipboard-write'],
      });
      contexts.push(context);
      const page = await context.newPage();
      listenTo(page, (complaint) => complaints.push(complaint));
      return { page, context };
    },
  };
}
