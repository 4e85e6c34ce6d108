import { lazy, Suspense, useCallback, useMemo, useState, useSyncExternalStore } from 'react';
import { ErrorBoundary } from '@/components/ui/ErrorBoundary';
import { Toasts, useToasts } from '@/components/ui/Toast';
import type { ReadingView } from '@/lib/contracts';
import { AddChart, PageChoice } from './charts/AddChart';
import { ChartList } from './charts/ChartList';
import { KeyHelp } from './dialogs/KeyHelp';
import { LostRace } from './dialogs/LostRace';
import { UnsavedOffer } from './dialogs/UnsavedOffer';
import { useModel } from './model/use-model';
import { editNumbers } from './points/PlaceEditor';
import { BenchBar } from './shell/BenchBar';
import { BenchStage } from './stage/BenchStage';
import type { FittedLine } from './stage/Layers';
import { StageToolbar } from './stage/StageToolbar';
import { ChartStation } from './stations/ChartStation';
import { CurvesStation } from './stations/CurvesStation';
import { FrameStation } from './stations/FrameStation';
import { HandInStation, Returned } from './stations/HandInStation';
import type { Overlay } from './stations/ModelStation';
import { makeTools } from './state/make-tools';
import type { BenchState } from './state/store';
import { ToolsContext, useBench, useChart, useTools } from './state/tools';
import { useSaving, useUndoKeys } from './state/use-lifetime';

const ModelStation = lazy(() => import('./stations/ModelStation').then((room) => ({ default: room.ModelStation })));

export interface BenchProps {
  readonly reading: ReadingView;
  readonly personId: string;
}

/** Where a reading is made: five stations over one draft. */
export function Bench({ reading, personId }: BenchProps) {
  const [tools] = useState(() => makeTools(reading, personId));
  useUndoKeys(tools);
  useSaving(tools);
  return (
    <ToolsContext value={tools}>
      <ErrorBoundary onError={() => void keepNow(tools)}>
        <Desk />
        <UnsavedOffer />
        <LostRace />
      </ErrorBoundary>
      <Announcements />
    </ToolsContext>
  );
}

/** Whatever stopped the bench, the draft is kept in the browser and sent to the server once more. */
const keepNow = async ({ unsaved, saver, store, reading, tab }: ReturnType<typeof makeTools>) => {
  if (!saver.unsaved()) return;
  const document = store.get().history.present;
  await unsaved.keep({ readingId: reading.id, tab, version: saver.confirmedVersion(), document, at: new Date().toISOString() });
  await saver.flush();
};

function Announcements() {
  const { announcer } = useTools();
  const message = useSyncExternalStore(announcer.subscribe, announcer.message);
  return (
    <p className="sr-only" role="status" aria-live="polite">
      {message}
    </p>
  );
}

const NO_LINES: readonly FittedLine[] = [];
const stationOf = ({ session }: BenchState) => session.station;

function Desk() {
  const { reading } = useTools();
  const station = useBench(stationOf);
  const [adding, setAdding] = useState(false);
  const [helping, setHelping] = useState(false);
  const [overlay, setOverlay] = useState<Overlay>({ shown: true, balance: 50 });
  const { toasts, show, close } = useToasts();
  const model = useModel(station === 'model' || station === 'hand-in');
  const fitted = useFitted(model.answer, station === 'model' && overlay.shown);
  const help = useCallback(() => setHelping(true), []);
  const add = useCallback(() => setAdding(true), []);
  const toolbar = useMemo(() => <StageToolbar onHelp={help} />, [help]);
  const over = station === 'model' && overlay.shown ? overlay.balance : null;
  return (
    <div className="bench" data-station={station}>
      <BenchBar onMessage={show} />
      {reading.reason !== null && station !== 'hand-in' && <Returned reason={reading.reason} />}
      <div className="bench-grid">
        <BenchStage
          help={help}
          editNumbers={editNumbers}
          fitted={fitted}
          pictureOpacity={over === null ? 1 : Math.min(1, 2 - over / 50)}
          fittedOpacity={over === null ? 1 : Math.min(1, over / 50)}
          toolbar={toolbar}
        />
        <aside className="bench-side" aria-label="Station">
          <StationPanel model={model} overlay={overlay} onOverlay={setOverlay} />
        </aside>
        <ChartList onAdd={add} />
      </div>
      <AddChart isOpen={adding} onClose={() => setAdding(false)} />
      <KeyHelp isOpen={helping} onClose={() => setHelping(false)} />
      <Toasts toasts={toasts} onClose={close} />
    </div>
  );
}

interface StationPanelProps {
  readonly model: ReturnType<typeof useModel>;
  readonly overlay: Overlay;
  readonly onOverlay: (overlay: Overlay) => void;
}

function StationPanel({ model, overlay, onOverlay }: StationPanelProps) {
  const { frozen } = useTools();
  const station = useBench(stationOf);
  const chart = useChart();
  if (station === 'model') {
    return (
      <Suspense fallback={<div className="bench-panel" aria-busy="true" />}>
        <ModelStation model={model} overlay={overlay} onOverlay={onOverlay} />
      </Suspense>
    );
  }
  if (station === 'hand-in') return <HandInStation model={model} />;
  if (!chart) {
    return (
      <div className="bench-panel">
        <h2>Begin with a page</h2>
        {frozen ? <p className="muted">This reading has no chart.</p> : <PageChoice onChosen={() => {}} />}
      </div>
    );
  }
  if (station === 'frame') return <FrameStation key={chart.id} chart={chart} />;
  if (station === 'curves') return <CurvesStation key={chart.id} chart={chart} />;
  return <ChartStation key={chart.id} chart={chart} />;
}

/** The fitted family of the chart in hand, in the styles of the curves it was fitted to. */
function useFitted(answer: ReturnType<typeof useModel>['answer'], shown: boolean): readonly FittedLine[] {
  const at = useBench((state) => state.history.present.charts.findIndex((chart) => chart.id === state.session.chart));
  return useMemo(() => {
    if (!answer || !shown) return NO_LINES;
    return answer.curves.filter((curve) => curve.chart === at).map((curve) => ({ points: curve.points, style: curve.curve }));
  }, [answer, shown, at]);
}
