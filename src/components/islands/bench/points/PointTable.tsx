import { memo, useEffect, useRef, type KeyboardEvent } from 'react';
import { curveName, type BenchChart, type BenchCurve } from '@/lib/editor';
import type { Px } from '@/lib/geometry';
import { formatNumber } from '@/lib/units';
import { announceSelection, removeSelected } from '../state/actions';
import { useSession, useTools } from '../state/tools';
import { editNumbers } from './PlaceEditor';
import { axisHead, valueTexts } from './words';

/** Every point of the curve in hand beside the picture: one choice for both, walked by the arrow keys. */
export function PointTable({ chart, curve }: { chart: BenchChart; curve: BenchCurve }) {
  const tools = useTools();
  const { selection } = useSession();
  const chosen = selection?.kind === 'point' && selection.curve === curve.id ? selection.point : null;
  const body = useRef<HTMLTableSectionElement>(null);
  const last = curve.points.length - 1;

  useEffect(() => {
    if (chosen !== null) showRow(body.current?.rows[chosen]);
  }, [chosen]);

  const pick = (point: number) => {
    tools.store.go({ type: 'select', selection: { kind: 'point', curve: curve.id, point } });
    const px = curve.points[point];
    if (px) tools.stage.reveal(px);
  };
  const walk = (event: KeyboardEvent) => {
    const to = nextRow(event, chosen ?? 0, last);
    if (to === null) return rowKey(event, tools);
    event.preventDefault();
    pick(to);
    announceSelection(tools);
    body.current?.rows[to]?.focus({ preventScroll: true });
  };

  if (curve.points.length === 0) return null;
  return (
    <div className="bench-points">
      <table
        className="table table-sticky"
        role="grid"
        aria-label={`Points of ${curveName(chart, curve)}`}
        aria-rowcount={curve.points.length + 1}
      >
        <thead>
          <tr>
            <th scope="col">Point</th>
            <th scope="col" className="num">
              {axisHead(chart, 'x')}
            </th>
            <th scope="col" className="num">
              {axisHead(chart, 'y')}
            </th>
            <th scope="col" className="num">
              x / px
            </th>
            <th scope="col" className="num">
              y / px
            </th>
            <th scope="col">Left out</th>
          </tr>
        </thead>
        <tbody ref={body} onKeyDown={walk}>
          {curve.points.map((px, index) => (
            <PointRow
              key={index}
              chart={chart}
              px={px}
              index={index}
              chosen={index === chosen}
              tab={index === (chosen ?? 0)}
              omitted={curve.omitted.includes(index)}
              onPick={pick}
            />
          ))}
        </tbody>
      </table>
    </div>
  );
}

/** Scrolls the list, never the page, until a row is in sight below the head. */
const showRow = (row: HTMLTableRowElement | undefined): void => {
  const list = row?.closest<HTMLElement>('.bench-points');
  if (!row || !list) return;
  const head = row.offsetHeight;
  if (row.offsetTop - head < list.scrollTop) list.scrollTop = row.offsetTop - head;
  else if (row.offsetTop + row.offsetHeight > list.scrollTop + list.clientHeight)
    list.scrollTop = row.offsetTop + row.offsetHeight - list.clientHeight;
};

interface PointRowProps {
  readonly chart: BenchChart;
  readonly px: Px;
  readonly index: number;
  readonly chosen: boolean;
  readonly tab: boolean;
  readonly omitted: boolean;
  readonly onPick: (index: number) => void;
}

const sameRow = (a: PointRowProps, b: PointRowProps): boolean =>
  a.px === b.px &&
  a.index === b.index &&
  a.chosen === b.chosen &&
  a.tab === b.tab &&
  a.omitted === b.omitted &&
  a.chart.marks === b.chart.marks &&
  a.chart.x === b.chart.x &&
  a.chart.y === b.chart.y &&
  a.chart.frame === b.chart.frame;

const PointRow = memo(function PointRow({ chart, px, index, chosen, tab, omitted, onPick }: PointRowProps) {
  const values = valueTexts(chart, px);
  return (
    <tr tabIndex={tab ? 0 : -1} aria-selected={chosen} onClick={() => onPick(index)} onFocus={() => !chosen && onPick(index)}>
      <td className="muted">{index + 1}</td>
      <td className="num">{values?.[0] ?? '–'}</td>
      <td className="num">{values?.[1] ?? '–'}</td>
      <td className="num muted">{formatNumber(px[0], { decimals: 1 })}</td>
      <td className="num muted">{formatNumber(px[1], { decimals: 1 })}</td>
      <td>{omitted ? 'left out' : ''}</td>
    </tr>
  );
}, sameRow);

/** The row an arrow, Home, End or Page key leads to; null for any other key. */
const nextRow = ({ key, ctrlKey, altKey, metaKey }: KeyboardEvent, at: number, last: number): number | null => {
  if (altKey || metaKey) return null;
  const to: Readonly<Record<string, number>> = {
    ArrowDown: at + 1,
    ArrowUp: at - 1,
    ']': at + 1,
    '[': at - 1,
    PageDown: at + 10,
    PageUp: at - 10,
    Home: 0,
    End: last,
  };
  const row = ctrlKey && key !== 'Home' && key !== 'End' ? undefined : to[key];
  return row === undefined ? null : Math.min(last, Math.max(0, row));
};

const rowKey = (event: KeyboardEvent, tools: ReturnType<typeof useTools>): void => {
  if (event.ctrlKey || event.metaKey || event.altKey) return;
  if (event.key === 'Delete' || event.key === 'Backspace') removeSelected(tools);
  else if (event.key === 'Enter' || event.key === 'F2') editNumbers();
  else if (event.key === 'Escape') tools.stage.focus();
  else return;
  event.preventDefault();
};
