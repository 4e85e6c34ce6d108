import { CATALOGUE_PARAMS, catalogueQuery, ROWS_A_PAGE, type CatalogueAnswer, type CatalogueQuery } from '@/lib/contracts';
import type { Actor } from '@/lib/access';
import { requireCan } from '../people';
import { filterEntries, sortEntries } from './filters';
import { catalogueEntries } from './memory';

/** One page of the catalogue: approved modules only. */
export async function catalogueList(actor: Actor, query: CatalogueQuery): Promise<CatalogueAnswer> {
  requireCan(actor, 'catalogue.see');
  const entries = await catalogueEntries();
  const { passed, unstated } = filterEntries(entries, query);
  const pages = Math.max(1, Math.ceil(passed.length / ROWS_A_PAGE));
  const page = Math.min(pages, Math.floor(query.page ?? 1));
  const rows = sortEntries(passed, query.sort, query.order).slice((page - 1) * ROWS_A_PAGE, page * ROWS_A_PAGE);
  return { total: entries.length, found: passed.length, unstated, page, pages, rows: rows.map(({ row }) => row) };
}

/** Vendors that have something in the catalogue, by name. */
export async function catalogueVendors(): Promise<{ id: number; name: string }[]> {
  const vendors = new Map((await catalogueEntries()).map(({ row }) => [row.vendor.id, row.vendor]));
  return [...vendors.values()].sort((a, b) => a.name.localeCompare(b.name, 'en'));
}

/** What an address asks for. A value that cannot be read gives a sentence and counts as left out; names that mean nothing are passed over. */
export function readCatalogueAddress(search: URLSearchParams) {
  const texts = Object.fromEntries(CATALOGUE_PARAMS.flatMap((name) => (search.has(name) ? [[name, search.get(name) ?? '']] : [])));
  const parsed = catalogueQuery.safeParse(texts);
  if (parsed.success) return { texts, query: parsed.data, problems: {} };
  const problems = Object.fromEntries(parsed.error.issues.map(({ path, message }) => [String(path[0]), message]));
  const readable = Object.fromEntries(Object.entries(texts).filter(([name]) => !(name in problems)));
  return { texts, query: catalogueQuery.parse(readable), problems };
}
