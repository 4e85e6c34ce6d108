import { useEffect, useRef } from 'react';
import { Button } from '@/components/ui/Button';
import { QuantityField } from '@/components/ui/QuantityField';
import { readyFrame, type BenchChart, type BenchMark } from '@/lib/editor';
import { markResiduals } from '@/lib/geometry';
import { formatNumber } from '@/lib/units';
import { useSession, useTools } from '../state/tools';
import { axisHead } from './words';

/** Distance of each mark from the lines of its values, px; null for a mark without a value or while there is no frame to spare. */
const distances = (chart: BenchChart): readonly (number | null)[] => {
  const frame = readyFrame(chart);
  if (!frame || frame.residualPx === null) return chart.marks.map(() => null);
  const marks = chart.marks.map(({ px, x, y }) => ({ px, ...(x !== null && { x }), ...(y !== null && { y }) }));
  return markResiduals(frame, marks).map(({ x, y }) => (x === null && y === null ? null : Math.hypot(x ?? 0, y ?? 0)));
};

/** Every mark of a chart with its typed values. */
export function MarkTable({ chart }: { chart: BenchChart }) {
  const session = useSession();
  const selected = session.selection?.kind === 'mark' ? session.selection.mark : null;
  const off = distances(chart);
  const table = useRef<HTMLTableElement>(null);
  useFocusOnPlaced(table, chart, selected);
  if (chart.marks.length === 0) return null;
  return (
    <table ref={table} className="table bench-marks">
      <caption className="sr-only">Marks and what is printed at each</caption>
      <thead>
        <tr>
          <th scope="col">Mark</th>
          <th scope="col" className="num">
            {axisHead(chart, 'x')}
          </th>
          <th scope="col" className="num">
            {axisHead(chart, 'y')}
          </th>
          <th scope="col" className="num">
            off / px
          </th>
          <th scope="col">
            <span className="sr-only">Remove</span>
          </th>
        </tr>
      </thead>
      <tbody>
        {chart.marks.map((mark, index) => (
          <MarkRow key={mark.id} chart={chart} mark={mark} number={index + 1} selected={mark.id === selected} off={off[index] ?? null} />
        ))}
      </tbody>
    </table>
  );
}

interface MarkRowProps {
  readonly chart: BenchChart;
  readonly mark: BenchMark;
  readonly number: number;
  readonly selected: boolean;
  readonly off: number | null;
}

function MarkRow({ chart, mark, number, selected, off }: MarkRowProps) {
  const { store, stage, frozen } = useTools();
  const pick = () => {
    if (selected) return;
    store.go({ type: 'select', selection: { kind: 'mark', mark: mark.id } });
    stage.reveal(mark.px);
  };
  const field = (axis: 'x' | 'y') => (
    <QuantityField
      label={`Mark ${number}: ${axisHead(chart, axis)}`}
      hideLabel
      size={6}
      value={mark[axis]}
      unit={undefined}
      onChange={(value) => store.perform({ type: 'setMark', chart: chart.id, mark: mark.id, to: { [axis]: value } })}
      isDisabled={frozen}
    />
  );
  return (
    <tr className={selected ? 'chosen' : undefined} onFocus={pick} data-mark={mark.id}>
      <td>
        <Button size="small" variant="quiet" aria-pressed={selected} aria-label={`Pick out mark ${number}`} onPress={pick}>
          {number}
        </Button>
      </td>
      <td className="num">{field('x')}</td>
      <td className="num">{field('y')}</td>
      <td className="num muted">{off === null ? '–' : formatNumber(off, { decimals: 1 })}</td>
      <td>
        {!frozen && (
          <Button
            size="small"
            variant="quiet"
            icon
            aria-label={`Remove mark ${number}`}
            onPress={() => store.perform({ type: 'removeMark', chart: chart.id, mark: mark.id })}
          >
            ×
          </Button>
        )}
      </td>
    </tr>
  );
}

/** A mark that was just clicked waits for its value: the x field takes the keyboard. A finger would bring the keypad up over the picture, so not then. */
function useFocusOnPlaced(table: React.RefObject<HTMLTableElement | null>, chart: BenchChart, selected: string | null): void {
  const known = useRef(new Set(chart.marks.map((mark) => mark.id)));
  useEffect(() => {
    const added = chart.marks.find((mark) => !known.current.has(mark.id));
    known.current = new Set(chart.marks.map((mark) => mark.id));
    if (!added || added.id !== selected || added.x !== null || matchMedia('(pointer: coarse)').matches) return;
    table.current?.querySelector<HTMLInputElement>(`[data-mark="${added.id}"] input`)?.focus({ preventScroll: true });
  }, [table, chart, selected]);
}
