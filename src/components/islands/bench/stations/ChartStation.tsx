import { Button } from '@/components/ui/Button';
import { NativeSelect } from '@/components/ui/NativeSelect';
import { QuantityField } from '@/components/ui/QuantityField';
import { RadioGroup } from '@/components/ui/RadioGroup';
import { TextField } from '@/components/ui/TextField';
import { chartName, chartState, kindOf, LIMITS, type BenchChart, type ChartKind } from '@/lib/editor';
import { useTools } from '../state/tools';
import { AxisFields } from './AxisFields';
import { KIND_CHOICES } from './choices';
import { Missing } from './Missing';
import { StationHead } from './StationHead';

const SIDES = [
  { id: 'hot', label: 'hot side' },
  { id: 'cold', label: 'cold side' },
] as const;

/** What a chart shows: page, kind, axes, family, and the side whose temperature it keeps. */
export function ChartStation({ chart }: { chart: BenchChart }) {
  const { store, pages, frozen } = useTools();
  const { perform } = store;
  const { id } = chart;
  return (
    <div className="bench-panel">
      <StationHead title="Chart" next="frame" onward="Go on to the frame" />
      <NativeSelect<ChartKind>
        label="Kind of chart"
        choices={KIND_CHOICES}
        value={kindOf(chart)}
        onChange={(kind) => perform({ type: 'setKind', chart: id, kind })}
        placeholder={chart.x.quantity && chart.y.quantity ? 'Another kind, as below' : 'Choose'}
        isDisabled={frozen}
      />
      <AxisFields
        name="x axis"
        value={chart.x}
        disabled={frozen}
        onChange={(to) => perform({ type: 'setAxis', chart: id, axis: 'x', to })}
      />
      <AxisFields
        name="y axis"
        value={chart.y}
        disabled={frozen}
        onChange={(to) => perform({ type: 'setAxis', chart: id, axis: 'y', to })}
      />
      <AxisFields
        name="curves by"
        value={chart.family}
        disabled={frozen}
        onChange={(to) => perform({ type: 'setFamily', chart: id, to })}
      />
      <div className="bench-side-field">
        <RadioGroup<'hot' | 'cold'>
          label="Which side keeps its temperature"
          orientation="horizontal"
          choices={SIDES}
          value={chart.side.kind}
          onChange={(kind) => perform({ type: 'setSide', chart: id, to: { kind } })}
          isDisabled={frozen}
        />
        <QuantityField
          key={id}
          label={`Temperature of the ${chart.side.kind} side`}
          unit="C"
          min={-273.15}
          max={2000}
          value={chart.side.celsius}
          onChange={(celsius) => perform({ type: 'setSide', chart: id, to: { celsius } })}
          isDisabled={frozen}
        />
      </div>
      <TextField
        label="Name"
        description={`Optional; left empty it is “${chartName({ ...chart, title: '' })}”.`}
        value={chart.title}
        maxLength={LIMITS.title}
        onChange={(title) => store.run({ type: 'setTitle', chart: id, title }, 'name chart')}
        isDisabled={frozen}
      />
      {pages.length > 1 && (
        <NativeSelect<string>
          label="Page"
          choices={pages.map(({ picture, label, sheet }) => ({
            id: String(picture.id),
            label: `${label} of ${sheet}`,
            hint: picture.name,
          }))}
          value={String(chart.pictureId)}
          onChange={(pictureId) => {
            const page = pages.find(({ picture }) => String(picture.id) === pictureId);
            if (page) perform({ type: 'setPicture', chart: id, picture: page.picture });
          }}
          isDisabled={frozen}
        />
      )}
      <Missing sentences={chartState(chart).chart} ready="All told. Next is the frame." />
      {!frozen && (
        <Button variant="quiet" className="justify-self-start" onPress={() => perform({ type: 'removeChart', chart: id })}>
          Remove this chart
        </Button>
      )}
    </div>
  );
}
