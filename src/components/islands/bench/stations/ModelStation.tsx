import { Button } from '@/components/ui/Button';
import { Slider } from '@/components/ui/Slider';
import { Switch } from '@/components/ui/Checkbox';
import type { ModelAnswer, Residual } from '@/lib/contracts';
import { chartName, type BenchDocument } from '@/lib/editor';
import { FitNumbers, ModelFacts, RatingsTable } from '../model/ModelFacts';
import { byCurve, outliersOf } from '../model/outliers';
import { ResidualTable } from '../model/ResidualPlot';
import type { ModelState } from '../model/use-model';
import { useBench, useTools } from '../state/tools';
import { StationHead } from './StationHead';

/** How the fitted curves lie over the picture. */
export interface Overlay {
  readonly shown: boolean;
  /** 0 shows only the picture, 100 only the fitted curves. */
  readonly balance: number;
}

export interface ModelStationProps {
  readonly model: ModelState;
  readonly overlay: Overlay;
  readonly onOverlay: (overlay: Overlay) => void;
}

const percent = (value: number) => `${value}\u00A0%`;

/** What the charts together say about the module. */
export function ModelStation({ model: { answer, fault, busy, again }, overlay, onOverlay }: ModelStationProps) {
  const document = useBench((state) => state.history.present);
  return (
    <div className="bench-panel" aria-busy={busy}>
      <StationHead title="Model" next="hand-in" onward="Go on to hand in">
        <span role="status" className="muted">
          {busy ? 'fitting' : ''}
        </span>
      </StationHead>
      {document.charts.length === 0 && <p className="muted">There is no chart to fit yet: add one at the chart station.</p>}
      {fault && (
        <p role="alert" className="notice notice-attention">
          {fault}{' '}
          <Button size="small" onPress={again}>
            Fit again
          </Button>
        </p>
      )}
      {answer?.result?.model && (
        <div className="bench-overlay">
          <Switch isSelected={overlay.shown} onChange={(shown) => onOverlay({ ...overlay, shown })}>
            Draw the fitted curves over the picture
          </Switch>
          <Slider
            label="Picture to curves"
            value={overlay.balance}
            onChange={(balance) => onOverlay({ ...overlay, balance })}
            format={percent}
            isDisabled={!overlay.shown}
          />
        </div>
      )}
      {answer && <Answer answer={answer} document={document} />}
    </div>
  );
}

function Answer({ answer, document }: { answer: ModelAnswer; document: BenchDocument }) {
  const pick = usePick(document);
  const model = answer.result?.model ?? null;
  const outliers = outliersOf(answer, document);
  return (
    <>
      {!model && <p className="notice">{answer.result?.modelMissing ?? 'No chart is finished yet, so there is nothing to fit.'}</p>}
      <Unfinished answer={answer} document={document} />
      {model && (
        <>
          <ModelFacts model={model} />
          <FitNumbers model={model} fit={answer.fit} />
          <RatingsTable ratings={answer.ratings} />
          <h3>Residuals</h3>
          {outliers.length > 0 && (
            <div className="notice notice-attention">
              <p className="font-semibold">These points stand out from their neighbours</p>
              <ul className="mt-1 flex flex-wrap gap-1">
                {outliers.slice(0, 12).map(({ residual, text }) => (
                  <li key={text}>
                    <Button size="small" onPress={() => pick(residual)}>
                      {text}
                    </Button>
                  </li>
                ))}
              </ul>
            </div>
          )}
          <ResidualTable groups={byCurve(answer.residuals)} charts={document.charts} onPick={pick} />
        </>
      )}
    </>
  );
}

/** Charts that are left out of the fit, and what each still misses. */
function Unfinished({ answer, document }: { answer: ModelAnswer; document: BenchDocument }) {
  if (answer.problems.length === 0) return null;
  return (
    <div className="notice">
      <p className="font-semibold">Not in the fit yet</p>
      <ul className="mt-1 list-disc pl-4">
        {answer.problems.map(({ chart, text }) => {
          const of = chart === null ? null : document.charts[chart];
          return (
            <li key={`${chart}${text}`}>
              {of && `${chartName(of)}: `}
              {text}
            </li>
          );
        })}
      </ul>
    </div>
  );
}

/** Leads to the point of a residual, ready to be looked at and moved. */
function usePick(document: BenchDocument): (residual: Residual) => void {
  const { store, stage } = useTools();
  return ({ chart, curve, point, px }) => {
    const of = document.charts[chart];
    const line = of?.curves[curve];
    if (!of || !line) return;
    store.go({ type: 'chart', chart: of.id });
    store.go({ type: 'station', station: 'curves' });
    store.go({ type: 'tool', tool: 'select' });
    store.go({ type: 'select', selection: { kind: 'point', curve: line.id, point } });
    requestAnimationFrame(() => stage.reveal(px));
  };
}
