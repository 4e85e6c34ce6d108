import { keepPreviousData, useQuery } from '@tanstack/react-query';
import { useEffect, useRef, useState } from 'react';
import { TemperatureRule } from '@/components/TemperatureRule';
import type { RulePoint } from '@/components/temperature-rule';
import { ErrorBoundary } from '@/components/ui/ErrorBoundary';
import { afterPointer, watchPointer } from '@/components/ui/pointer';
import type { DutyAnswer } from '@/lib/contracts';
import { parseDuty, type Duty, type DutyParam, type ParsedDuty } from '@/lib/duty';
import { formatWithUnit } from '@/lib/units';
import { api, ApiProblem } from '../api';
import { queryClient } from '../query';
import { formTexts, type Texts } from '../shared/address';
import { useAddress } from '../shared/use-address';
import { useLiveForm } from '../shared/use-live-form';
import { DutyAnswerView } from './DutyAnswerView';
import { DutyForm } from './DutyForm';

const PATH = '/duty';
const EXAMPLE = '?heat=12&cold=4&hot=45&current=6&voltage=15&air=30&humidity=60';

interface Props {
  /** What the address said when the page was drawn, and the answer to it where it was a whole duty. */
  texts: Texts;
  answer: DutyAnswer | null;
}

interface Asked {
  readonly duty: Duty;
  readonly answer: DutyAnswer;
}

/** The answer to a duty; while there is none, or while a new one is on its way, the one before stays. */
function useAnswer(duty: Duty | null, drawn: Props) {
  const [first] = useState(() => JSON.stringify(parseDuty(drawn.texts).duty));
  const key = JSON.stringify(duty);
  const query = useQuery(
    {
      queryKey: ['duty', key],
      queryFn: async ({ signal }): Promise<Asked> => ({ duty: duty!, answer: await api.post<DutyAnswer>('/api/duty', duty, { signal }) }),
      enabled: duty !== null,
      initialData: duty && drawn.answer && key === first ? { duty, answer: drawn.answer } : undefined,
      placeholderData: keepPreviousData,
    },
    queryClient(),
  );
  const fault = query.error instanceof ApiProblem ? query.error.detail : null;
  return { asked: query.data ?? null, fault, stale: duty === null || query.isPlaceholderData || fault !== null };
}

/** The duty search: a form, its temperature rule and its answer, all in the address; complete without a script, live with one. */
export function DutySearch(props: Props) {
  return (
    <ErrorBoundary>
      <Search {...props} />
    </ErrorBoundary>
  );
}

function Search(props: Props) {
  const { texts, generation, go } = useAddress(PATH, props.texts);
  const form = useRef<HTMLFormElement>(null);
  // a sentence about a field waits until the person has left it
  const [shown, setShown] = useState(() => parseDuty(props.texts).problems);
  const parsed = parseDuty(texts);
  const live = useLiveForm(form, texts, (next) => go(next, 'replace'));
  const { asked, fault, stale } = useAnswer(parsed.duty, props);
  const problems = stillWrong(shown, parsed);
  useEffect(watchPointer, []);
  const onLeave = () => afterPointer(() => setShown(parseDuty(form.current ? formTexts(form.current) : texts).problems));
  const onSubmit = (event: { preventDefault: () => void }) => {
    live.onSubmit(event);
    onLeave();
  };
  return (
    <>
      <Rule duty={parsed.duty ?? asked?.duty ?? null} />
      <div className="mt-4 grid grid-cols-[minmax(0,1fr)] items-start gap-5 lg:grid-cols-[20rem_minmax(0,1fr)]">
        <DutyForm
          key={generation}
          form={form}
          texts={texts}
          problems={problems}
          module={texts.module}
          onInput={live.onInput}
          onSubmit={onSubmit}
          onLeave={onLeave}
        />
        <div aria-busy={stale && parsed.duty !== null}>
          {fault && <p className="notice notice-attention mb-3">{fault}</p>}
          <Missing parsed={parsed} problems={problems} />
          {asked && (
            <div style={{ opacity: stale ? 0.55 : 1 }}>
              <DutyAnswerView duty={asked.duty} answer={asked.answer} chosen={Number(texts.module) || null} />
            </div>
          )}
        </div>
      </div>
    </>
  );
}

/** Sentences shown before that still hold. */
const stillWrong = (shown: ParsedDuty['problems'], { problems }: ParsedDuty): ParsedDuty['problems'] =>
  Object.fromEntries((Object.keys(shown) as DutyParam[]).flatMap((param) => (problems[param] ? [[param, problems[param]]] : [])));

const list = (names: readonly string[]) => names.join(', ').replace(/, ([^,]*)$/, ' and $1');

/** What keeps the form from being a duty; with nothing filled in at all, a way to begin. */
function Missing({ parsed: { missing }, problems }: { parsed: ParsedDuty; problems: ParsedDuty['problems'] }) {
  if (missing.length === 3)
    return (
      <div className="sheet empty">
        <h2>What has to be cooled, and from where to where?</h2>
        <p className="mt-1">
          Give the heat and the temperatures of both faces of the module; every approved module is then held against them. Limits of the
          supply and the air can be added.
        </p>
        <p className="mt-3">
          <a className="btn" href={PATH + EXAMPLE}>
            Try an example
          </a>
        </p>
      </div>
    );
  if (missing.length > 0) return <p className="notice mb-3">Still to be filled in: {list(missing)}.</p>;
  return Object.keys(problems).length > 0 ? <p className="notice notice-attention mb-3">Mend the marked fields to get an answer.</p> : null;
}

/** The faces and the air on the temperature rule; its place is kept while there is no duty. */
function Rule({ duty }: { duty: Duty | null }) {
  if (!duty) return null;
  const { coldFaceC, hotFaceC, ambientC } = duty;
  const air: RulePoint[] = ambientC === undefined ? [] : [{ label: 'air', celsius: ambientC, role: 'ambient' }];
  const difference = formatWithUnit(hotFaceC - coldFaceC, 'K', { decimals: 1 });
  return (
    <div className="sheet px-6 pb-2 pt-3">
      <TemperatureRule
        points={[{ label: 'cold face', celsius: coldFaceC, role: 'cold' }, ...air, { label: 'hot face', celsius: hotFaceC, role: 'hot' }]}
        caption={`ΔT over the module ${difference}`}
      />
    </div>
  );
}
