import type { DutyAnswer, DutyMissView } from '@/lib/contracts';
import { missSummary, type Duty } from '@/lib/duty';
import { formatNumber } from '@/lib/units';

const SHOWN_AT_ONCE = 6;
const number = (value: number) => formatNumber(value, { digits: 3 });

interface MissesProps {
  misses: readonly DutyMissView[];
  chosen: number | null;
  /** The duty as an address, so that a module's page can show it. */
  search: string;
}

const MissTable = ({ misses, chosen, search, caption }: MissesProps & { caption: string }) => (
  <div className="table-scroll relative" role="region" aria-label={caption} tabIndex={0}>
    <table className="table">
      <caption className="sr-only">{caption}</caption>
      <thead>
        <tr>
          <th scope="col">Module</th>
          <th scope="col">Why not</th>
          <th scope="col" className="num">
            Most heat within the limits / W
          </th>
          <th scope="col" className="num">
            at / A
          </th>
        </tr>
      </thead>
      <tbody>
        {misses.map(({ module, reasons, reach }) => (
          <tr key={module.id} className={module.id === chosen ? 'chosen' : undefined}>
            <th scope="row" className="min-w-32">
              <a href={`/modules/${module.id}?${search}`}>{module.name}</a> <small className="font-normal">{module.vendor}</small>
            </th>
            <td className="min-w-56">{reasons.map(({ text }) => text).join('; ')}</td>
            <td className="num">{number(reach.heatW)}</td>
            <td className="num">{number(reach.currentA)}</td>
          </tr>
        ))}
      </tbody>
    </table>
  </div>
);

/** Modules that do not do the duty and why, the closest first; most of them folded up. */
export function DutyMisses({ duty, answer, chosen, search }: Omit<MissesProps, 'misses'> & { duty: Duty; answer: DutyAnswer }) {
  const { misses, missCount, missCounts } = answer;
  if (missCount === 0) return null;
  const [near, far] = [misses.slice(0, SHOWN_AT_ONCE), misses.slice(SHOWN_AT_ONCE)];
  return (
    <section className="mt-5" aria-labelledby="misses">
      <h2 id="misses">{missCount === 1 ? '1 does not' : `${missCount} do not`}</h2>
      <p className="muted mb-2">{missSummary(duty, missCounts)}. The closest:</p>
      <div className="sheet">
        <MissTable misses={near} chosen={chosen} search={search} caption="Modules that come closest" />
      </div>
      {far.length > 0 && (
        <details className="sheet mt-2">
          <summary className="px-3 py-2">
            {far.length} more{missCount > misses.length && `, of ${missCount - SHOWN_AT_ONCE}`}
          </summary>
          <MissTable misses={far} chosen={chosen} search={search} caption="The other modules that do not do it" />
        </details>
      )}
    </section>
  );
}
