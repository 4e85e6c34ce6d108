import { useState } from 'react';
import { api, ApiProblem } from '@/components/islands/api';
import { Button } from '@/components/ui/Button';
import { TextField } from '@/components/ui/TextField';
import { chartName, problemsOf, type BenchChart, type ChartProblem } from '@/lib/editor';
import type { ModelState } from '../model/use-model';
import { useBench, useSaveState, useTools } from '../state/tools';

interface Item {
  readonly done: boolean;
  readonly text: string;
  readonly problems: readonly ChartProblem[];
}

const chartItem = (chart: BenchChart): Item => {
  const problems = problemsOf(chart);
  return { done: problems.length === 0, text: chartName(chart), problems };
};

/** What a reading should have before another person looks at it, and the way there. */
export function HandInStation({ model }: { model: ModelState }) {
  const { reading } = useTools();
  if (reading.may.takeBack) return <TakeBack />;
  return (
    <div className="bench-panel bench-hand-in">
      <h2>Hand in for review</h2>
      {reading.reason !== null && <Returned reason={reading.reason} />}
      {reading.may.handIn ? (
        <HandInForm model={model} />
      ) : (
        <p className="muted">{RESTING[reading.state] ?? 'This reading is not yours to hand in.'}</p>
      )}
    </div>
  );
}

const RESTING: Readonly<Partial<Record<string, string>>> = {
  'handed-in': 'This reading has been handed in and waits for a librarian.',
  approved: 'This reading has been approved; it stays as it is. A correction is a new reading.',
  superseded: 'A newer reading of this module has been approved; this one stays as it was.',
  withdrawn: 'This reading has been withdrawn.',
};

export const Returned = ({ reason }: { reason: string }) => (
  <div className="notice notice-attention">
    <p className="font-semibold">Returned to be mended</p>
    <p className="mt-1 whitespace-pre-line">{reason || 'No reason was written down.'}</p>
  </div>
);

function HandInForm({ model }: { model: ModelState }) {
  const charts = useBench((state) => state.history.present.charts);
  const [note, setNote] = useState('');
  const { send, busy, fault } = useHandIn();
  const { answer } = model;
  const fitted = answer?.result?.model != null;
  const items: readonly Item[] = [
    {
      done: charts.length > 0,
      text: charts.length > 0 ? 'At least one chart' : 'At least one chart: add one from a page of the sheet',
      problems: [],
    },
    ...charts.map(chartItem),
    {
      done: fitted,
      text: fitted ? 'The charts give a model' : (answer?.result?.modelMissing ?? 'The charts give no model yet'),
      problems: [],
    },
  ];
  const ready = items.every((item) => item.done);
  return (
    <>
      <ul className="bench-checklist">
        {items.map((item) => (
          <ChecklistItem key={item.text} item={item} />
        ))}
      </ul>
      <TextField
        multiline
        label="Note to the reviewer"
        description="Optional: what was hard to read, what you left out and why."
        value={note}
        onChange={setNote}
        maxLength={2000}
      />
      {fault && (
        <p role="alert" className="notice notice-attention">
          {fault}
        </p>
      )}
      {!ready && <p className="muted">Once every line has its tick, the reading can be handed in.</p>}
      <Button variant="primary" isDisabled={!ready || busy} onPress={() => send(note)}>
        {busy ? 'Handing in' : 'Hand in'}
      </Button>
    </>
  );
}

function ChecklistItem({ item }: { item: Item }) {
  const { store } = useTools();
  const lead = ({ chart, station }: ChartProblem) => {
    store.go({ type: 'chart', chart });
    store.go({ type: 'station', station });
  };
  return (
    <li className={item.done ? 'is-done' : undefined}>
      <span className="bench-tick" aria-hidden="true">
        {item.done ? '✓' : ''}
      </span>
      <div>
        <span>{item.text}</span>
        <span className="sr-only">{item.done ? ', done' : ', still to do'}</span>
        {item.problems.map((problem) => (
          <div key={problem.text} className="mt-1">
            <button type="button" className="bench-link" onClick={() => lead(problem)}>
              {problem.text}
            </button>
          </div>
        ))}
      </div>
    </li>
  );
}

function TakeBack() {
  const { reading } = useTools();
  const [fault, setFault] = useState<string | null>(null);
  const takeBack = async () => {
    try {
      await api.post(`/api/readings/${reading.id}/take-back`, {}, { ifMatch: `"${reading.version}"` });
      location.reload();
    } catch (problem) {
      setFault(problem instanceof ApiProblem ? problem.detail : 'That did not work. Try again.');
    }
  };
  return (
    <div className="bench-panel bench-hand-in">
      <h2>Handed in</h2>
      <p>This reading waits for a librarian. While it waits it cannot be changed; take it back to go on with it.</p>
      {fault && (
        <p role="alert" className="notice notice-attention">
          {fault}
        </p>
      )}
      <div>
        <Button onPress={() => void takeBack()}>Take it back</Button>
      </div>
    </div>
  );
}

/** Saves what is unsaved, then hands the saved version in; the page comes back as the server now sees it. */
function useHandIn() {
  const { reading, saver } = useTools();
  const save = useSaveState();
  const [busy, setBusy] = useState(false);
  const [fault, setFault] = useState<string | null>(null);
  const send = async (note: string) => {
    setBusy(true);
    setFault(null);
    try {
      await saver.flush();
      if (saver.unsaved()) throw new ApiProblem(0, 'The reading is not saved yet, so it cannot be handed in. See the line at the top.');
      await api.post(`/api/readings/${reading.id}/hand-in`, { note }, { ifMatch: `"${saver.confirmedVersion()}"` });
      location.reload();
    } catch (problem) {
      setBusy(false);
      setFault(problem instanceof ApiProblem ? problem.detail : 'That did not work. Try again.');
    }
  };
  return { send: (note: string) => void send(note), busy: busy || save.kind === 'conflict', fault };
}
