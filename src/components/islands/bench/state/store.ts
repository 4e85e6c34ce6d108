import {
  apply,
  historyReducer,
  label,
  sessionReducer,
  settle,
  startHistory,
  startSession,
  type BenchDocument,
  type Command,
  type History,
  type HistoryAction,
  type Session,
  type SessionAction,
  type Station,
} from '@/lib/editor';

/** What the bench shows: the draft with its history, and where the person is in it. */
export interface BenchState {
  readonly history: History<BenchDocument>;
  readonly session: Session;
}

/** The one place where the draft changes. */
export interface BenchStore {
  readonly get: () => BenchState;
  readonly subscribe: (listener: () => void) => () => void;
  readonly perform: (command: Command, name?: string) => void;
  /** Several commands as one step. */
  readonly together: (commands: readonly Command[], name: string) => void;
  /** One step of a run that makes one entry, such as nudges: the entry closes after a pause or with the next other thing done. */
  readonly run: (command: Command, name: string) => void;
  readonly undo: () => void;
  readonly redo: () => void;
  readonly go: (action: SessionAction) => void;
}

/** How long a run of nudges stays open. */
const RUN_MS = 800;

const reduce = historyReducer({ apply, label });

/** A store over a draft. With `frozen` nothing in the draft changes, and the person still moves about in it. */
export function createBenchStore(document: BenchDocument, frozen: boolean, station?: Station): BenchStore {
  let state: BenchState = { history: startHistory(document), session: startSession(document, station) };
  let timer: ReturnType<typeof setTimeout> | undefined;
  const listeners = new Set<() => void>();

  const become = (next: BenchState) => {
    if (next.history === state.history && next.session === state.session) return;
    state = next;
    for (const listener of listeners) listener();
  };
  const act = (action: HistoryAction<Command>) => {
    if (frozen) return;
    const history = reduce(state.history, action);
    become({ history, session: settle(state.session, history.present) });
  };
  const closeRun = () => {
    clearTimeout(timer);
    if (state.history.gesture) act({ type: 'commit' });
  };

  return {
    get: () => state,
    subscribe: (listener) => {
      listeners.add(listener);
      return () => listeners.delete(listener);
    },
    perform: (command, name) => {
      clearTimeout(timer);
      act({ type: 'perform', command, ...(name !== undefined && { label: name }) });
    },
    together: (commands, name) => {
      clearTimeout(timer);
      act({ type: 'begin', label: name });
      for (const command of commands) act({ type: 'preview', command });
      act({ type: 'commit' });
    },
    run: (command, name) => {
      if (state.history.gesture?.label !== name) act({ type: 'begin', label: name });
      act({ type: 'preview', command });
      clearTimeout(timer);
      timer = setTimeout(closeRun, RUN_MS);
    },
    undo: () => {
      closeRun();
      act({ type: 'undo' });
    },
    redo: () => {
      closeRun();
      act({ type: 'redo' });
    },
    go: (action) => {
      closeRun();
      become({ ...state, session: sessionReducer(state.session, action, state.history.present) });
    },
  };
}
