import { Button } from '@/components/ui/Button';
import { Menu } from '@/components/ui/Menu';
import { NativeSelect } from '@/components/ui/NativeSelect';
import { chartName, chartState, frameOf, type BenchChart } from '@/lib/editor';
import { frameDoubt, type Frame, type FrameKind } from '@/lib/geometry';
import { unitSymbol } from '@/lib/units';
import { placeAt } from '../state/actions';
import { useBench, useTools } from '../state/tools';
import { MarkTable } from '../points/MarkTable';
import { PlaceEditor } from '../points/PlaceEditor';
import { smallNumber } from '../points/words';
import { Missing } from './Missing';
import { StationHead } from './StationHead';

const KINDS = [
  { id: 'auto', label: 'as the marks ask' },
  { id: 'upright', label: 'upright', hint: 'a straight scan' },
  { id: 'turned', label: 'turned', hint: 'a scan at an angle' },
  { id: 'perspective', label: 'perspective', hint: 'a photograph' },
] as const;

/** Marks with what is printed there, and the frame they give. */
export function FrameStation({ chart }: { chart: BenchChart }) {
  const tools = useTools();
  const { store, frozen, stage } = tools;
  const outcome = frameOf(chart);
  return (
    <div className="bench-panel">
      <StationHead title="Frame" next="curves" onward="Go on to the curves" />
      <p className="muted">
        Click a tick whose value is printed, and type that value. Two corners with both values are enough; more marks tell how good the
        frame is.
      </p>
      <MarkTable chart={chart} />
      <div className="flex flex-wrap gap-2">
        {!frozen && <Button onPress={() => placeAt(tools, stage.aim()?.px ?? stage.middle())}>Add a mark in the middle</Button>}
        {!frozen && <CopyMarks chart={chart} />}
      </div>
      <PlaceEditor chart={chart} />
      <NativeSelect<FrameKind | 'auto'>
        row
        label="Kind of frame"
        choices={KINDS}
        value={chart.frame ?? 'auto'}
        onChange={(kind) => store.perform({ type: 'setFrameKind', chart: chart.id, kind: kind === 'auto' ? null : kind })}
        isDisabled={frozen}
      />
      {outcome.ok && <FrameFacts frame={outcome.frame} chart={chart} />}
      {outcome.ok && <FrameDoubt frame={outcome.frame} chart={chart} />}
      <Missing sentences={chartState(chart).frame} ready="The frame stands. Next are the curves." />
    </div>
  );
}

/** Kind and goodness of the frame. */
function FrameFacts({ frame, chart }: { frame: Frame; chart: BenchChart }) {
  const units = (axis: 'x' | 'y') => {
    const value = frame.residualInUnits[axis];
    const { unit } = chart[axis];
    const symbol = unit ? unitSymbol(unit) : '';
    return value === null ? '–' : `${smallNumber(value)}${symbol && `\u00A0${symbol}`}`;
  };
  return (
    <dl className="pairs">
      <dt>Frame</dt>
      <dd>{frame.kind}</dd>
      <dt>Residual of the marks</dt>
      {frame.residualPx === null ? (
        <dd>no mark to spare</dd>
      ) : (
        <dd>
          {smallNumber(frame.residualPx)}&nbsp;px, that is {units('x')} in x and {units('y')} in y
        </dd>
      )}
    </dl>
  );
}

/** A frame that stands but is unlikely to be what was meant. */
function FrameDoubt({ frame, chart }: { frame: Frame; chart: BenchChart }) {
  const known = chart.marks.flatMap(({ px, x, y }) =>
    x === null && y === null ? [] : [{ px, ...(x !== null && { x }), ...(y !== null && { y }) }],
  );
  const doubt = frameDoubt(frame, known);
  return doubt && <p className="notice notice-attention">{doubt}</p>;
}

/** Takes the marks of another chart, for pages whose charts are drawn alike. */
function CopyMarks({ chart }: { chart: BenchChart }) {
  const { store } = useTools();
  const charts = useBench((state) => state.history.present.charts);
  const others = charts.filter((other) => other !== chart && other.marks.length > 0);
  if (others.length === 0) return null;
  return (
    <Menu
      label="Copy marks from"
      items={others.map((other) => ({ id: other.id, label: chartName(other), hint: `${other.marks.length} marks` }))}
      onAction={(from) => store.perform({ type: 'takeMarks', chart: chart.id, from })}
    />
  );
}
