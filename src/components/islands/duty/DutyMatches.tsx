import { Chip } from '@/components/ui/Chip';
import { gradeWords } from '@/components/ui/chip-tones';
import type { DoubtfulView, DutyMatchView } from '@/lib/contracts';
import { formatNumber } from '@/lib/units';
import { Uncertain } from '../shared/Figure';
import { CopBar } from './CopBar';

const DIGITS = 3;
const number = (value: number) => formatNumber(value, { digits: DIGITS });

/** A value with its uncertainty, and under it what a module at the low end of its tolerance makes of it. */
const Doubtful = ({ value, u, low }: Omit<DoubtfulView, 'tolerance'> & { low: string | null }) => (
  <>
    <Uncertain value={value} u={u} />
    {low && (
      <>
        <br />
        <small>{low}</small>
      </>
    )}
  </>
);

const current = ({ value, u, tolerance }: DoubtfulView) => (
  <Doubtful value={value} u={u} low={tolerance ? `to ${number(value + tolerance)}` : null} />
);

function Cop({ cop }: Pick<DutyMatchView, 'cop'>) {
  if (cop === null) return <span className="muted">no power</span>;
  return <Doubtful value={cop.value} u={cop.u} low={cop.tolerance ? `to ${number(cop.value - cop.tolerance)}` : null} />;
}

interface RowProps {
  match: DutyMatchView;
  best: number;
  chosen: boolean;
  /** The duty as an address, so that the module's page can show it. */
  search: string;
}

function Row({ match, best, chosen, search }: RowProps) {
  const { module, cop, notes } = match;
  const grade = gradeWords(module.grade);
  return (
    <tr className={chosen ? 'chosen' : undefined}>
      <th scope="row" className="min-w-44">
        <a href={`/modules/${module.id}?${search}`}>{module.name}</a>
        <br />
        <small className="font-normal">{module.vendor}</small>
        {notes.map(({ kind, text }) => (
          <small key={kind} className="block font-normal">
            {text}
          </small>
        ))}
      </th>
      <td className="num">
        <Cop cop={cop} />
      </td>
      <td className="max-sm:hidden">
        <CopBar share={cop === null || best === 0 ? 1 : cop.value / best} />
      </td>
      <td className="num">{current(match.current)}</td>
      <td className="num">{number(match.voltageV)}</td>
      <td className="num">{number(match.powerW)}</td>
      <td className="num">+{number(match.reserveW)}</td>
      <td className="num">{number(match.heatRejectedW)}</td>
      <td className="num">{formatNumber(match.shareOfImax * 100, { decimals: 0 })}</td>
      <td>
        <Chip tone={grade.tone}>{grade.text}</Chip>
      </td>
    </tr>
  );
}

const HEADINGS = ['Current / A', 'Voltage / V', 'Power / W', 'Reserve / W', 'Heat rejected / W', 'of Imax / %'] as const;

/** Modules that do the duty, best COP first. */
export function DutyMatches({ matches, chosen, search }: { matches: readonly DutyMatchView[]; chosen: number | null; search: string }) {
  const best = Math.max(0, ...matches.map(({ cop }) => cop?.value ?? 0));
  return (
    <div className="table-scroll relative sheet" role="region" aria-label="Modules that do it" tabIndex={0}>
      <table className="table">
        <caption>
          Best COP first. Figures in brackets are one standard uncertainty of the reading, in the last digits. “to” is what a module at the
          low end of its sheet’s tolerance comes to.
        </caption>
        <thead>
          <tr>
            <th scope="col">Module</th>
            <th scope="col" className="num">
              COP
            </th>
            <td className="max-sm:hidden" />
            {HEADINGS.map((heading) => (
              <th key={heading} scope="col" className="num">
                {heading}
              </th>
            ))}
            <th scope="col">Rests on</th>
          </tr>
        </thead>
        <tbody>
          {matches.map((match) => (
            <Row key={match.module.id} match={match} best={best} chosen={match.module.id === chosen} search={search} />
          ))}
        </tbody>
      </table>
    </div>
  );
}
