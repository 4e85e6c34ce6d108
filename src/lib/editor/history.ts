import { same } from './change';

/** One step that can be undone (in `past`: the document before it) or done again (in `future`: the document after it). */
export interface Step<D> {
  readonly label: string;
  readonly document: D;
}

/**
 * Undo as plain data. Whole documents are kept; unchanged parts are shared, so that this is cheap.
 * While a `gesture` is open (a drag, a run of nudges) its previews change `present` and make no steps.
 */
export interface History<D> {
  readonly past: readonly Step<D>[];
  readonly present: D;
  readonly future: readonly Step<D>[];
  readonly gesture: Step<D> | null;
}

/** What can be done to a history. `label` overrides the command's own. */
export type HistoryAction<C> =
  | { readonly type: 'perform'; readonly command: C; readonly label?: string }
  | { readonly type: 'begin'; readonly label: string }
  | { readonly type: 'preview'; readonly command: C }
  | { readonly type: 'commit' }
  | { readonly type: 'cancel' }
  | { readonly type: 'undo' }
  | { readonly type: 'redo' };

/** What a kind of document must tell its history. */
export interface HistoryRules<D, C> {
  readonly apply: (document: D, command: C) => D;
  readonly label: (command: C) => string;
}

/** Steps kept; the oldest go first. */
export const HISTORY_LIMIT = 1000;

/** A history that begins at a document. */
export const startHistory = <D>(present: D): History<D> => ({ past: [], present, future: [], gesture: null });

const recorded = <D>(history: History<D>, step: Step<D>, present: D): History<D> =>
  same(present, step.document)
    ? { ...history, present: step.document, gesture: null }
    : { past: [...history.past, step].slice(-HISTORY_LIMIT), present, future: [], gesture: null };

const commit = <D>(history: History<D>): History<D> => (history.gesture ? recorded(history, history.gesture, history.present) : history);

const undo = <D>(history: History<D>): History<D> => {
  const step = history.past.at(-1);
  if (!step || history.gesture) return history;
  return {
    past: history.past.slice(0, -1),
    present: step.document,
    future: [{ label: step.label, document: history.present }, ...history.future],
    gesture: null,
  };
};

const redo = <D>(history: History<D>): History<D> => {
  const [step, ...future] = history.future;
  if (!step || history.gesture) return history;
  return { past: [...history.past, { label: step.label, document: history.present }], present: step.document, future, gesture: null };
};

/**
 * The history after an action, as a pure reducer. Laws: a command that changes nothing makes no step and keeps redo; one
 * gesture is one step; `cancel` gives back the document of `begin` and leaves no trace; undo and redo are refused while a
 * gesture is open; performing a command closes an open gesture first.
 */
export const historyReducer =
  <D, C>(rules: HistoryRules<D, C>) =>
  (history: History<D>, action: HistoryAction<C>): History<D> => {
    switch (action.type) {
      case 'perform': {
        const closed = commit(history);
        const present = rules.apply(closed.present, action.command);
        if (present === closed.present) return closed;
        return recorded(closed, { label: action.label ?? rules.label(action.command), document: closed.present }, present);
      }
      case 'begin': {
        const closed = commit(history);
        return { ...closed, gesture: { label: action.label, document: closed.present } };
      }
      case 'preview': {
        if (!history.gesture) return history;
        const present = rules.apply(history.present, action.command);
        return present === history.present ? history : { ...history, present };
      }
      case 'commit':
        return commit(history);
      case 'cancel':
        return history.gesture ? { ...history, present: history.gesture.document, gesture: null } : history;
      case 'undo':
        return undo(history);
      case 'redo':
        return redo(history);
    }
  };

/** The label of the step that undo takes back, or null. */
export const undoLabel = <D>(history: History<D>): string | null => (history.gesture ? null : (history.past.at(-1)?.label ?? null));

/** The label of the step that redo does again, or null. */
export const redoLabel = <D>(history: History<D>): string | null => (history.gesture ? null : (history.future[0]?.label ?? null));
