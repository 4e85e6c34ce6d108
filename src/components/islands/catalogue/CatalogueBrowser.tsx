import { keepPreviousData, useQuery } from '@tanstack/react-query';
import { useRef, type ReactNode } from 'react';
import { ErrorBoundary } from '@/components/ui/ErrorBoundary';
import type { CatalogueAnswer, CatalogueSort } from '@/lib/contracts';
import { api, ApiProblem } from '../api';
import { queryClient } from '../query';
import { addressOf, isPlainClick, type Texts } from '../shared/address';
import { useAddress } from '../shared/use-address';
import { useLiveForm } from '../shared/use-live-form';
import { CatalogueFilters, type Vendor } from './CatalogueFilters';
import { CatalogueTable } from './CatalogueTable';

const PATH = '/catalogue';
/** What narrows the catalogue, as against how it is shown. */
const FILTERS = ['q', 'vendor', 'heatFrom', 'heatTo', 'sideFrom', 'sideTo', 'stages', 'grade'];

interface Props {
  /** What the address said when the page was drawn, and the answer to it. */
  texts: Texts;
  answer: CatalogueAnswer;
  problems: Texts;
  vendors: readonly Vendor[];
}

type Changes = Readonly<Record<string, string | undefined>>;

function useCatalogue(texts: Texts, drawn: Props) {
  const asked = addressOf('/api/catalogue', texts);
  const query = useQuery(
    {
      queryKey: ['catalogue', asked],
      queryFn: ({ signal }) => api.get<CatalogueAnswer>(asked, signal),
      initialData: asked === addressOf('/api/catalogue', drawn.texts) ? drawn.answer : undefined,
      placeholderData: keepPreviousData,
    },
    queryClient(),
  );
  const refusal = query.error instanceof ApiProblem ? query.error : null;
  const problems = texts === drawn.texts ? drawn.problems : (refusal?.fields ?? {});
  const fault = refusal && Object.keys(refusal.fields).length === 0 ? refusal.detail : null;
  return { answer: query.data ?? drawn.answer, problems, fault, stale: query.isPlaceholderData || refusal !== null };
}

/** The catalogue: filters, order and page, all in the address; complete without a script, live with one. */
export function CatalogueBrowser(props: Props) {
  return (
    <ErrorBoundary>
      <Browser {...props} />
    </ErrorBoundary>
  );
}

function Browser(props: Props) {
  const { texts, generation, go } = useAddress(PATH, props.texts);
  const { answer, problems, fault, stale } = useCatalogue(texts, props);
  const form = useRef<HTMLFormElement>(null);
  const { page: _page, ...pageless } = texts;
  const live = useLiveForm(form, pageless, (next) => go(next, 'replace'));
  const hrefOf = (changes: Changes) => addressOf(PATH, texts, changes);
  const follow = (changes: Changes, redraw = false) => {
    const address = new URL(hrefOf(changes), window.location.href);
    go(Object.fromEntries(address.searchParams), 'push', redraw);
  };
  const sort = {
    key: (texts.sort ?? 'module') as CatalogueSort,
    direction: texts.order === 'descending' ? ('descending' as const) : ('ascending' as const),
  };
  const filtered = FILTERS.some((name) => texts[name]);
  const clear = Object.fromEntries([...FILTERS, 'page', 'unstated'].map((name) => [name, undefined]));
  const link = { hrefOf, follow };
  return (
    <>
      <CatalogueFilters key={generation} form={form} texts={texts} problems={problems} vendors={props.vendors} {...live} />
      <div className="mb-2 flex flex-wrap items-baseline gap-x-4 gap-y-1">
        <p role="status">
          <b>{countText(answer, filtered)}</b>
        </p>
        <Unstated answer={answer} shown={texts.unstated === 'show'} {...link} />
        {filtered && (
          <Go changes={clear} redraw {...link}>
            Clear the filters
          </Go>
        )}
        {fault && <p className="error">{fault}</p>}
      </div>
      <div className="sheet" aria-busy={stale} style={{ opacity: stale ? 0.6 : 1 }}>
        {answer.rows.length > 0 ? (
          <CatalogueTable rows={answer.rows} links={{ sort, hrefOf, go: follow }} />
        ) : (
          <Nothing filtered={filtered} total={answer.total} />
        )}
      </div>
      <Pages answer={answer} {...link} />
    </>
  );
}

const modules = (count: number) => (count === 1 ? '1 module' : `${count} modules`);
const countText = ({ found, total }: CatalogueAnswer, filtered: boolean) => (filtered ? `${found} of ${modules(total)}` : modules(total));

interface LinkProps {
  hrefOf: (changes: Changes) => string;
  follow: (changes: Changes, redraw?: boolean) => void;
}

/** A link that works without a script and changes the page in place with one. */
const Go = ({
  changes,
  redraw = false,
  hrefOf,
  follow,
  children,
  ...rest
}: LinkProps & { changes: Changes; redraw?: boolean; children: ReactNode; className?: string; rel?: string }) => (
  <a
    {...rest}
    href={hrefOf(changes)}
    onClick={(event) => {
      if (!isPlainClick(event)) return;
      event.preventDefault();
      follow(changes, redraw);
    }}
  >
    {children}
  </a>
);

function Unstated({ answer: { unstated }, shown, ...link }: LinkProps & { answer: CatalogueAnswer; shown: boolean }) {
  if (unstated === 0) return null;
  const are = unstated === 1 ? 'whose sheet does' : 'whose sheets do';
  return (
    <p className="muted">
      {shown ? `With ${unstated} ${are} not state what is filtered by. ` : `${unstated} more ${are} not state what is filtered by. `}
      <Go changes={{ unstated: shown ? undefined : 'show', page: undefined }} redraw {...link}>
        {shown ? 'Leave them out' : 'Show them too'}
      </Go>
    </p>
  );
}

const Nothing = ({ filtered, total }: { filtered: boolean; total: number }) => (
  <div className="empty">
    <h2>{filtered && total > 0 ? 'No module passes these filters' : 'Nothing is approved yet'}</h2>
    <p className="mt-1">
      {filtered && total > 0
        ? 'Widen a range, take a word away, or clear the filters.'
        : 'A module comes into the catalogue when a librarian approves a reading of its sheet.'}
    </p>
  </div>
);

function Pages({ answer: { page, pages }, ...link }: LinkProps & { answer: CatalogueAnswer }) {
  if (pages < 2) return null;
  return (
    <nav className="mt-3 flex items-center gap-3" aria-label="Pages">
      {page > 1 && (
        <Go className="btn" rel="prev" changes={{ page: page === 2 ? undefined : String(page - 1) }} {...link}>
          Previous
        </Go>
      )}
      <span>
        Page {page} of {pages}
      </span>
      {page < pages && (
        <Go className="btn" rel="next" changes={{ page: String(page + 1) }} {...link}>
          Next
        </Go>
      )}
    </nav>
  );
}
