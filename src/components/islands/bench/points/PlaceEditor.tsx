import { memo, useState } from 'react';
import { Button } from '@/components/ui/Button';
import { NativeSelect } from '@/components/ui/NativeSelect';
import { QuantityField } from '@/components/ui/QuantityField';
import { Checkbox } from '@/components/ui/Checkbox';
import { findCurve, placeOf, placeOfSelection, valueAt, type BenchChart, type Selection } from '@/lib/editor';
import type { Px } from '@/lib/geometry';
import { moveSelectedTo, nudgeSelected, removeSelected, selectionName, stepSelection } from '../state/actions';
import { useSession, useTools } from '../state/tools';
import { axisHead } from './words';

/** The id of the first field, which Enter on the picture leads to. */
const NUMBERS_ID = 'bench-numbers';

/** Gives the keyboard to the numbers of what is picked out, ready to be typed over. */
export const editNumbers = (): void => {
  const field = document.getElementById(NUMBERS_ID);
  if (!(field instanceof HTMLInputElement)) return;
  field.focus();
  field.select();
};

/** What is picked out, as numbers that can be typed over and as buttons for every key. */
export function PlaceEditor({ chart }: { chart: BenchChart }) {
  const { frozen } = useTools();
  const { selection } = useSession();
  const px = placeOfSelection(chart, selection);
  if (!selection || !px) return null;
  return (
    <section className="bench-place" aria-label={selectionName(chart, selection)}>
      <header className="flex items-baseline gap-2">
        <h3>{selectionName(chart, selection)}</h3>
        <StepButtons />
      </header>
      <PlaceFields chart={chart} px={px} selection={selection} />
      {!frozen && <NudgeButtons />}
      {!frozen && selection.kind === 'point' && <LeaveOut chart={chart} selection={selection} />}
    </section>
  );
}

const StepButtons = memo(function StepButtons() {
  const tools = useTools();
  return (
    <span className="ml-auto flex gap-1">
      <Button size="small" icon aria-label="Previous" onPress={() => stepSelection(tools, -1)}>
        [
      </Button>
      <Button size="small" icon aria-label="Next" onPress={() => stepSelection(tools, 1)}>
        ]
      </Button>
    </span>
  );
});

/** The place in pixels and, where there is a frame, in the units of the axes; typing into either moves it. */
function PlaceFields({ chart, px, selection }: { chart: BenchChart; px: Px; selection: Selection }) {
  const tools = useTools();
  const value = selection.kind === 'point' ? valueAt(chart, px) : null;
  const key = selection.kind === 'mark' ? selection.mark : `${selection.curve}/${selection.point}`;
  const move = (to: Px | null) => to && moveSelectedTo(tools, to);
  const put = <T extends readonly [number, number]>(pair: T, at: 0 | 1, n: number | null): Px | null =>
    n === null ? null : at === 0 ? [n, pair[1]] : [pair[0], n];
  return (
    <div className="bench-place-fields" key={key}>
      {([0, 1] as const).map((at) => (
        <QuantityField
          key={`px${at}`}
          id={at === 0 ? NUMBERS_ID : undefined}
          label={`${'xy'[at]} / px`}
          size={7}
          digits={7}
          step={1}
          value={px[at]}
          onChange={(n) => move(put(px, at, n))}
          isDisabled={tools.frozen}
        />
      ))}
      {value &&
        ([0, 1] as const).map((at) => (
          <QuantityField
            key={`value${at}`}
            label={axisHead(chart, at === 0 ? 'x' : 'y')}
            size={7}
            digits={5}
            value={value[at]}
            onChange={(n) => {
              const to = put(value, at, n);
              move(to && placeOf(chart, to));
            }}
            isDisabled={tools.frozen}
          />
        ))}
    </div>
  );
}

const STEPS = [
  { id: '0.1', label: '0.1\u00A0px' },
  { id: '1', label: '1\u00A0px' },
  { id: '10', label: '10\u00A0px' },
] as const;

const ARROWS = [
  ['←', 'left', [-1, 0]],
  ['→', 'right', [1, 0]],
  ['↑', 'up', [0, -1]],
  ['↓', 'down', [0, 1]],
] as const;

/** The arrow keys as buttons; the same for whatever is picked out. */
const NudgeButtons = memo(function NudgeButtons() {
  const tools = useTools();
  const [step, setStep] = useState<'0.1' | '1' | '10'>('1');
  return (
    <div className="flex flex-wrap items-center gap-1">
      {ARROWS.map(([arrow, name, [dx, dy]]) => (
        <Button
          key={name}
          size="small"
          icon
          aria-label={`Move ${name} by ${step}\u00A0px`}
          onPress={() => nudgeSelected(tools, [dx * Number(step), dy * Number(step)])}
        >
          {arrow}
        </Button>
      ))}
      <NativeSelect label="Step" hideLabel choices={STEPS} value={step} onChange={setStep} className="bench-step" />
      <Button size="small" onPress={() => tools.store.go({ type: 'tool', tool: 'target' })}>
        Move by a click
      </Button>
      <Button size="small" variant="quiet" onPress={() => removeSelected(tools)}>
        Remove
      </Button>
    </div>
  );
});

function LeaveOut({ chart, selection }: { chart: BenchChart; selection: Extract<Selection, { kind: 'point' }> }) {
  const { store } = useTools();
  const omitted = findCurve(chart, selection.curve)?.omitted.includes(selection.point) ?? false;
  return (
    <Checkbox
      isSelected={omitted}
      onChange={(out) =>
        store.perform({ type: 'omitPoint', chart: chart.id, curve: selection.curve, point: selection.point, omitted: out })
      }
    >
      Leave this point out of the fit
    </Checkbox>
  );
}
