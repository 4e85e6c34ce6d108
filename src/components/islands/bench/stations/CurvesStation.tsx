import { Button } from '@/components/ui/Button';
import { chartState, type BenchChart } from '@/lib/editor';
import { CurveTable } from '../points/CurveTable';
import { PlaceEditor } from '../points/PlaceEditor';
import { PointTable } from '../points/PointTable';
import { addCurve } from '../state/actions';
import { useCurve, useTools } from '../state/tools';
import { Missing } from './Missing';
import { StationHead } from './StationHead';

/** The curves of a chart, their values and their points. */
export function CurvesStation({ chart }: { chart: BenchChart }) {
  const tools = useTools();
  const curve = useCurve();
  return (
    <div className="bench-panel">
      <StationHead title="Curves" next="model" onward="Go on to the model" />
      <CurveTable chart={chart} />
      {!tools.frozen && (
        <div className="flex flex-wrap gap-2">
          <Button onPress={() => addCurve(tools, chart, null)}>Add a curve</Button>
          {curve && curve.points.length > 0 && (
            <Button variant="quiet" onPress={() => tools.store.perform({ type: 'clearPoints', chart: chart.id, curve: curve.id })}>
              Remove its points
            </Button>
          )}
        </div>
      )}
      {chart.curves.length === 0 ? (
        <p className="muted">
          Add a curve, type the value printed beside its line, then click along the line: eight points or so on a gentle curve.
        </p>
      ) : (
        curve &&
        curve.points.length === 0 && <p className="muted">Click along its line in the picture: eight points or so on a gentle curve.</p>
      )}
      <PlaceEditor chart={chart} />
      {curve && <PointTable key={curve.id} chart={chart} curve={curve} />}
      <Missing sentences={chartState(chart).curves} ready="All curves of this chart are ready for the model." />
    </div>
  );
}
