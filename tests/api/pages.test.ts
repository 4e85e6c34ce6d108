import { readdirSync } from 'node:fs';
import { beforeAll, expect, inject, test } from 'vitest';
import { clientOf, type Client } from '../support/api';

const E = 'engineer';
const L = 'librarian';
const D = 'designer';
const A = 'administrator';
type Who = typeof E | typeof L | typeof D | typeof A;

/** Who may open each page. Numbers lead nowhere: past the door that is the page "not found", before it "refused" or the sign-in page. */
const PAGES: Record<string, { readonly may: readonly Who[]; readonly missing?: true } | 'open'> = {
  '/404': 'open',
  '/500': 'open',
  '/refused': 'open',
  '/sign-in': 'open',
  '/sign-out': 'open',
  '/': { may: [E, L, D, A] },
  '/account': { may: [E, L, D, A] },
  '/catalogue': { may: [E, L, D, A] },
  '/modules/[id]': { may: [E, L, D, A], missing: true },
  '/vendors/[id]': { may: [E, L, D, A], missing: true },
  '/duty': { may: [E, L, D] },
  '/sheets': { may: [E, L] },
  '/sheets/new': { may: [E, L] },
  '/sheets/[id]': { may: [E, L, D, A], missing: true },
  '/bench/[reading]': { may: [E, L], missing: true },
  '/review': { may: [L] },
  '/review/[reading]': { may: [E, L, D, A], missing: true },
  '/admin/outbox': { may: [A] },
  '/admin/trail': { may: [A] },
  '/admin/team': { may: [A] },
};

const base = inject('baseUrl');
const clients = new Map<Who | null, Client>();
beforeAll(async () => {
  for (const who of [null, E, L, D, A] as const) clients.set(who, await clientOf(base, who));
});

const address = (page: string) => page.replace(/\[\w+\]/, '999999');
const guarded = Object.entries(PAGES).flatMap(([page, rule]) =>
  rule === 'open' ? [] : ([E, L, D, A] as const).map((who) => ({ page, who, rule, allowed: rule.may.includes(who) })),
);

test.each(guarded)('$page for the $who: $allowed', async ({ page, who, rule, allowed }) => {
  const answer = await clients.get(who)!.get(address(page), { Accept: 'text/html' });
  expect(answer.status).toBe(allowed ? (rule.missing ? 404 : 200) : 403);
});

test.each(Object.entries(PAGES).filter(([, rule]) => rule !== 'open'))(
  '%s sends who is not signed in to the sign-in page, and back',
  async (page) => {
    const answer = await clients.get(null)!.get(address(page), { Accept: 'text/html' });
    expect(answer.status).toBe(303);
    expect(answer.headers.get('location')).toBe(`/sign-in?next=${encodeURIComponent(address(page))}`);
  },
);

test('every page of the site stands in this table', () => {
  const files = (readdirSync('src/pages', { recursive: true }) as string[]).filter((file) => file.endsWith('.astro'));
  const routes = files.map((file) => `/${file}`.replace(/\.astro$/, '').replace(/\/index$/, '') || '/');
  expect(routes.sort()).toEqual(Object.keys(PAGES).sort());
});

test('the sign-in page sends nobody off the site', async () => {
  for (const next of ['https://evil.example/', '//evil.example/', '/\\evil.example', 'javascript:alert(1)']) {
    const answer = await clients.get(E)!.get(`/sign-in?next=${encodeURIComponent(next)}`, { Accept: 'text/html' });
    expect(answer.headers.get('location') ?? '/').toMatch(/^\/(?![/\\])/);
  }
});
