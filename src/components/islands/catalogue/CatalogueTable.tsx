import { Chip } from '@/components/ui/Chip';
import { gradeWords } from '@/components/ui/chip-tones';
import { classes } from '@/components/ui/classes';
import { nextSort, sortGlyph, type Sort } from '@/components/ui/sort';
import { formatDate } from '@/components/when';
import type { CatalogueRow, CatalogueSort } from '@/lib/contracts';
import { formatNumber } from '@/lib/units';
import { isPlainClick } from '../shared/address';
import { NotStated, Plain, Uncertain } from '../shared/Figure';
import { APPROVED, COLUMNS, type Column } from './columns';

export interface Links {
  readonly sort: Sort<CatalogueSort>;
  readonly hrefOf: (changes: Readonly<Record<string, string | undefined>>) => string;
  readonly go: (changes: Readonly<Record<string, string | undefined>>) => void;
}

function Heading({ column, links: { sort, hrefOf, go } }: { column: Column; links: Links }) {
  const next = nextSort(sort, column.key, column.first);
  const changes = { sort: next.key, order: next.direction, page: undefined };
  return (
    <th
      scope="col"
      className={classes(column.numeric && 'num', column.wide && 'max-md:hidden')}
      aria-sort={sort.key === column.key ? sort.direction : undefined}
    >
      <a
        className="sort"
        href={hrefOf(changes)}
        onClick={(event) => {
          if (!isPlainClick(event)) return;
          event.preventDefault();
          go(changes);
        }}
      >
        {column.label} <span aria-hidden="true">{sortGlyph(sort, column.key)}</span>
      </a>
    </th>
  );
}

const sides = ([width, depth]: readonly [number, number]) => `${formatNumber(width)}\u00A0×\u00A0${formatNumber(depth)}`;

/** Both plates; the hot one on a line of its own where it differs. */
function Plates({ coldPlateMm, hotPlateMm }: CatalogueRow) {
  if (!coldPlateMm && !hotPlateMm) return <NotStated />;
  if (!coldPlateMm || !hotPlateMm) return <>{sides((coldPlateMm ?? hotPlateMm)!)}</>;
  if (sides(coldPlateMm) === sides(hotPlateMm)) return <>{sides(coldPlateMm)}</>;
  return (
    <>
      {sides(coldPlateMm)}
      <br />
      <small>hot {sides(hotPlateMm)}</small>
    </>
  );
}

function Row({ row }: { row: CatalogueRow }) {
  const grade = gradeWords(row.grade);
  return (
    <tr>
      <th scope="row" className="min-w-32">
        <a href={`/modules/${row.id}`}>{[row.partNumber, row.variant].filter(Boolean).join(' ')}</a>
        <small className="block font-normal md:hidden">{row.vendor.name}</small>
      </th>
      <td className="max-md:hidden">{row.vendor.name}</td>
      {[row.qmax, row.dtmax, row.imax, row.vmax].map(({ value, u, unit }) => (
        <td key={unit} className="num">
          <Uncertain value={value} u={u} />
        </td>
      ))}
      <td className="num">
        <Plain value={row.stages} />
      </td>
      <td className="num">
        <Plain value={row.couples} />
      </td>
      <td className="num">
        <Plates {...row} />
      </td>
      <td className="num">
        <Plain value={row.heightMm} decimals={1} />
      </td>
      <td>
        <Chip tone={grade.tone}>{grade.text}</Chip>
      </td>
      <td className="whitespace-nowrap">
        {row.approvedAt ? <time dateTime={row.approvedAt}>{formatDate(row.approvedAt)}</time> : <NotStated />}
      </td>
    </tr>
  );
}

/** The modules found, as a plain table whose headings are links that sort. */
export function CatalogueTable({ rows, links }: { rows: readonly CatalogueRow[]; links: Links }) {
  return (
    <div className="table-scroll relative" role="region" aria-label="Modules" tabIndex={0}>
      <table className="table table-sticky">
        <caption>
          What the model of each module implies with its hot side at 27&nbsp;°C. Figures in brackets are one standard uncertainty of the
          reading, in the last digits; they are not the tolerance of a delivered part. Headings sort.
        </caption>
        <thead>
          <tr>
            {COLUMNS.map((column) => (
              <Heading key={column.key} column={column} links={links} />
            ))}
            <th scope="col">Rests on</th>
            <Heading column={APPROVED} links={links} />
          </tr>
        </thead>
        <tbody>
          {rows.map((row) => (
            <Row key={row.id} row={row} />
          ))}
        </tbody>
      </table>
    </div>
  );
}
