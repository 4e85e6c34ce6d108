import type { DutyAnswer } from '@/lib/contracts';
import { dutyTexts, type Duty } from '@/lib/duty';
import { formatWithUnit } from '@/lib/units';
import { addressOf } from '../shared/address';
import { Condensation } from './Condensation';
import { DutyMatches } from './DutyMatches';
import { DutyMisses } from './DutyMisses';

const modules = (count: number) => (count === 1 ? '1 module' : `${count} modules`);

function title({ matchCount, candidates }: DutyAnswer): string {
  if (candidates === 0) return 'Nothing is approved yet';
  if (matchCount === 0) return candidates === 1 ? 'The one module there is does not do it' : `None of ${modules(candidates)} does it`;
  return `${matchCount} of ${modules(candidates)} ${matchCount === 1 ? 'does' : 'do'} it`;
}

function asked({ heatW, coldFaceC, hotFaceC }: Duty): string {
  const difference = formatWithUnit(Number((hotFaceC - coldFaceC).toPrecision(6)), 'K');
  return `${formatWithUnit(heatW, 'W')} from ${formatWithUnit(coldFaceC, 'C')} to ${formatWithUnit(hotFaceC, 'C')}, ΔT ${difference}`;
}

/** What the duty was started for: why that one is not among the matches. */
function ChosenMiss({ answer, chosen }: { answer: DutyAnswer; chosen: number | null }) {
  const miss = chosen === null ? undefined : answer.misses.find(({ module }) => module.id === chosen);
  if (!miss) return null;
  return (
    <p className="notice notice-attention mb-3">
      <b>{miss.module.name} does not do this:</b> {miss.reasons.map(({ text }) => text).join('; ')}.
    </p>
  );
}

/** The answer to a duty: how many do it, which, how they run, and why the others do not. */
export function DutyAnswerView({ duty, answer, chosen }: { duty: Duty; answer: DutyAnswer; chosen: number | null }) {
  const search = addressOf('', dutyTexts(duty) as Record<string, string>).slice(1);
  return (
    <>
      <div className="mb-2 flex flex-wrap items-baseline gap-x-3">
        <h2 className="m-0" role="status">
          {title(answer)}
        </h2>
        <span className="muted">{asked(duty)}</span>
      </div>
      <ChosenMiss answer={answer} chosen={chosen} />
      {answer.matches.length > 0 && <DutyMatches matches={answer.matches} chosen={chosen} search={search} />}
      {answer.matchCount > answer.matches.length && (
        <p className="hint mt-2">The best {answer.matches.length} are shown; tighten a limit to see fewer.</p>
      )}
      {answer.matchCount === 0 && answer.candidates > 0 && (
        <p className="sheet empty">
          Bring the faces closer together, ask for less heat, or raise a limit. Several modules can share the heat.
        </p>
      )}
      {answer.candidates === 0 && <p className="sheet empty">The search looks through approved modules. It starts with the first one.</p>}
      <Condensation duty={duty} found={answer.condensation} />
      <DutyMisses duty={duty} answer={answer} chosen={chosen} search={search} />
    </>
  );
}
