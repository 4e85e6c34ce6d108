import { useCallback, useEffect, useState } from 'react';
import { api, ApiProblem } from '@/components/islands/api';
import type { ModelAnswer } from '@/lib/contracts';
import type { BenchDocument } from '@/lib/editor';
import { useBench, useTools } from '../state/tools';

/** What the server made of a draft. `stale`: the draft has changed since and is being fitted again. */
export interface ModelState {
  readonly answer: ModelAnswer | null;
  readonly fault: string | null;
  readonly busy: boolean;
  readonly again: () => void;
}

/** Quiet time after a change before the draft is fitted again. */
const SETTLE_MS = 400;

interface Outcome {
  readonly document: BenchDocument;
  readonly answer: ModelAnswer | null;
  readonly fault: string | null;
}

/** Fits the draft in hand on the server for as long as `wanted`, always the newest state, one request at a time. */
export function useModel(wanted: boolean): ModelState {
  const { reading } = useTools();
  const document = useBench((state) => (wanted ? state.history.present : null));
  const [outcome, setOutcome] = useState<Outcome | null>(null);
  const [asked, setAsked] = useState(0);
  const due = document !== null && document.charts.length > 0 && outcome?.document !== document;

  useEffect(() => {
    if (!due || !document) return;
    const control = new AbortController();
    const timer = setTimeout(() => {
      api
        .post<ModelAnswer>(`/api/readings/${reading.id}/model`, { document }, { signal: control.signal })
        .then((answer) => setOutcome({ document, answer, fault: null }))
        .catch((fault: unknown) => {
          if (control.signal.aborted) return;
          const detail = fault instanceof ApiProblem ? fault.detail : 'The fit did not answer. Try again.';
          setOutcome((before) => ({ document, answer: before?.answer ?? null, fault: detail }));
        });
    }, SETTLE_MS);
    return () => {
      clearTimeout(timer);
      control.abort();
    };
  }, [due, document, reading.id, asked]);

  const again = useCallback(() => {
    setOutcome((before) => before && { ...before, document: { ...before.document } });
    setAsked((count) => count + 1);
  }, []);
  return { answer: outcome?.answer ?? null, fault: outcome && outcome.document === document ? outcome.fault : null, busy: due, again };
}
