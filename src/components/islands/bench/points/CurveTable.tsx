import { memo, useEffect, useRef } from 'react';
import { Button } from '@/components/ui/Button';
import { QuantityField } from '@/components/ui/QuantityField';
import { curveName, type BenchChart, type BenchCurve } from '@/lib/editor';
import { quantityName, unitSymbol } from '@/lib/units';
import { useSession, useTools } from '../state/tools';
import { RATING_SYMBOLS } from './words';
import { Swatch } from './Swatch';

/** What the family's values are called at the head of the column: "Current / A". */
const familyHead = ({ family: { quantity, unit, of } }: BenchChart): string => {
  if (!quantity) return 'Value';
  const name = quantityName(quantity);
  const parts = [name.charAt(0).toUpperCase() + name.slice(1), of ? RATING_SYMBOLS[of] : '', unit ? unitSymbol(unit) : ''];
  return parts.filter(Boolean).join(' / ');
};

/** Every curve of a chart with its value, and which one is in hand. */
export function CurveTable({ chart }: { chart: BenchChart }) {
  const { curve: inHand } = useSession();
  const table = useRef<HTMLTableElement>(null);
  useFocusOnAdded(table, chart, inHand);
  if (chart.curves.length === 0) return null;
  return (
    <table ref={table} className="table bench-curves">
      <caption className="sr-only">Curves of this chart</caption>
      <thead>
        <tr>
          <th scope="col">Curve</th>
          <th scope="col" className="num">
            {familyHead(chart)}
          </th>
          <th scope="col" className="num">
            Points
          </th>
          <th scope="col">
            <span className="sr-only">Remove</span>
          </th>
        </tr>
      </thead>
      <tbody>
        {chart.curves.map((curve, index) => (
          <CurveRow
            key={curve.id}
            chart={chart.id}
            curve={curve}
            name={curveName(chart, curve)}
            head={familyHead(chart)}
            style={index}
            inHand={curve.id === inHand}
          />
        ))}
      </tbody>
    </table>
  );
}

interface CurveRowProps {
  readonly chart: string;
  readonly curve: BenchCurve;
  readonly name: string;
  readonly head: string;
  readonly style: number;
  readonly inHand: boolean;
}

const CurveRow = memo(function CurveRow({ chart, curve, name, head, style, inHand }: CurveRowProps) {
  const { store, frozen } = useTools();
  const take = () => {
    if (!inHand) store.go({ type: 'curve', curve: curve.id });
  };
  return (
    <tr className={inHand ? 'chosen' : undefined} onFocus={take} data-curve={curve.id}>
      <td>
        <Button size="small" variant="quiet" aria-pressed={inHand} aria-label={`Take ${name} in hand`} onPress={take}>
          <Swatch style={style} />
        </Button>
      </td>
      <td className="num">
        <QuantityField
          label={`Value of curve ${style + 1}: ${head}`}
          hideLabel
          size={6}
          value={curve.value}
          onChange={(value) => store.perform({ type: 'setCurveValue', chart, curve: curve.id, value })}
          isDisabled={frozen}
        />
      </td>
      <td className="num">
        {curve.points.length}
        {curve.omitted.length > 0 && <small> ({curve.omitted.length}&nbsp;out)</small>}
      </td>
      <td>
        {!frozen && (
          <Button
            size="small"
            variant="quiet"
            icon
            aria-label={`Remove ${name}`}
            onPress={() => store.perform({ type: 'removeCurve', chart, curve: curve.id })}
          >
            ×
          </Button>
        )}
      </td>
    </tr>
  );
});

/** A curve that was just added by its button waits for its value. */
function useFocusOnAdded(table: React.RefObject<HTMLTableElement | null>, chart: BenchChart, inHand: string | null): void {
  const known = useRef(new Set(chart.curves.map((curve) => curve.id)));
  useEffect(() => {
    const added = chart.curves.find((curve) => !known.current.has(curve.id));
    known.current = new Set(chart.curves.map((curve) => curve.id));
    if (!added || added.id !== inHand || added.value !== null || added.points.length > 0) return;
    table.current?.querySelector<HTMLInputElement>(`[data-curve="${added.id}"] input`)?.focus({ preventScroll: true });
  }, [table, chart, inHand]);
}
