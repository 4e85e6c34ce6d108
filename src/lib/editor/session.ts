import type { Px } from '@/lib/geometry';
import type { Command } from './commands';
import type { BenchChart, BenchDocument } from './document';
import { findChart, findCurve } from './document';
import { readyFrame } from './frame';

/** The five stations of the bench, in order. */
export const STATIONS = ['chart', 'frame', 'curves', 'model', 'hand-in'] as const;
export type Station = (typeof STATIONS)[number];

/** What is picked out: a mark by its id, or a point by its curve and its index. */
export type Selection =
  { readonly kind: 'mark'; readonly mark: string } | { readonly kind: 'point'; readonly curve: string; readonly point: number };

/** `select`: pick and drag; `place`: a press on the picture places; `target`: the next press moves what is picked out there. */
export type Tool = 'select' | 'place' | 'target';

/** What a person is looking at. Not part of the draft, not in its history, never clears redo. */
export interface Session {
  readonly station: Station;
  readonly chart: string | null;
  readonly curve: string | null;
  readonly selection: Selection | null;
  readonly tool: Tool;
}

/** What changes a session. */
export type SessionAction =
  | { readonly type: 'station'; readonly station: Station }
  | { readonly type: 'chart'; readonly chart: string | null }
  | { readonly type: 'curve'; readonly curve: string | null }
  | { readonly type: 'select'; readonly selection: Selection | null }
  | { readonly type: 'tool'; readonly tool: Tool }
  | { readonly type: 'step'; readonly by: 1 | -1 };

/** Before anything has been picked: a station, the first unless another is named, at the first chart. */
export const startSession = (document: BenchDocument, station: Station = 'chart'): Session =>
  settle({ station, chart: null, curve: null, selection: null, tool: 'select' }, document);

const picked = (selection: Selection | null, chart: BenchChart | null): Selection | null => {
  if (!selection || !chart) return null;
  if (selection.kind === 'mark') return chart.marks.some((mark) => mark.id === selection.mark) ? selection : null;
  const last = (findCurve(chart, selection.curve)?.points.length ?? 0) - 1;
  if (last < 0) return null;
  return selection.point <= last ? selection : { ...selection, point: last };
};

/** The session with everything it names really there: after an undo or a removal it falls back to what is nearest. Same object when all is well. */
export function settle(session: Session, document: BenchDocument): Session {
  const chart = findChart(document, session.chart) ?? document.charts[0] ?? null;
  const curve = findCurve(chart, session.curve) ?? chart?.curves[0] ?? null;
  const selection = picked(session.selection, chart);
  const tool = session.tool === 'target' && !selection ? 'select' : session.tool;
  const settled = { ...session, chart: chart?.id ?? null, curve: curve?.id ?? null, selection, tool };
  const unchanged = (Object.keys(settled) as (keyof Session)[]).every((key) => settled[key] === session[key]);
  return unchanged ? session : settled;
}

const usualTool = (station: Station, chart: BenchChart | null): Tool => {
  if (station === 'curves') return 'place';
  return station === 'frame' && chart && !readyFrame(chart) ? 'place' : 'select';
};

const belongs = (selection: Selection | null, station: Station): boolean => selection?.kind === (station === 'frame' ? 'mark' : 'point');

const enter = (session: Session, station: Station, document: BenchDocument): Session => ({
  ...session,
  station,
  selection: belongs(session.selection, station) ? session.selection : null,
  tool: usualTool(station, findChart(document, session.chart)),
});

const select = (session: Session, selection: Selection | null): Session => ({
  ...session,
  selection,
  curve: selection?.kind === 'point' ? selection.curve : session.curve,
  tool: session.tool === 'target' ? 'select' : session.tool,
});

const step = (session: Session, by: 1 | -1, document: BenchDocument): Session => {
  const chart = findChart(document, session.chart);
  const choices: readonly Selection[] =
    session.station === 'frame'
      ? (chart?.marks ?? []).map((mark) => ({ kind: 'mark', mark: mark.id }))
      : (findCurve(chart, session.curve)?.points ?? []).map((_, point) => ({ kind: 'point', curve: session.curve ?? '', point }));
  const at = choices.findIndex((choice) => sameSelection(choice, session.selection));
  const next = at < 0 ? (by > 0 ? 0 : choices.length - 1) : Math.min(choices.length - 1, Math.max(0, at + by));
  return select(session, choices[next] ?? null);
};

const changed = (session: Session, action: SessionAction, document: BenchDocument): Session => {
  switch (action.type) {
    case 'station':
      return enter(session, action.station, document);
    case 'chart':
      return enter({ ...session, chart: action.chart, curve: null, selection: null }, session.station, document);
    case 'curve':
      return { ...session, curve: action.curve, selection: null };
    case 'select':
      return select(session, action.selection);
    case 'tool':
      return { ...session, tool: action.tool };
    case 'step':
      return step(session, action.by, document);
  }
};

/** The session after an action, settled on the document. */
export const sessionReducer = (session: Session, action: SessionAction, document: BenchDocument): Session =>
  settle(changed(session, action, document), document);

/** Whether two selections pick out the same thing. */
export const sameSelection = (a: Selection | null, b: Selection | null): boolean => {
  if (!a || !b) return a === b;
  if (a.kind === 'mark') return b.kind === 'mark' && a.mark === b.mark;
  return b.kind === 'point' && a.curve === b.curve && a.point === b.point;
};

/** Where what is picked out lies on the picture; null when nothing is. */
export const placeOfSelection = (chart: BenchChart | null, selection: Selection | null): Px | null => {
  if (!chart || !selection) return null;
  if (selection.kind === 'mark') return chart.marks.find((mark) => mark.id === selection.mark)?.px ?? null;
  return findCurve(chart, selection.curve)?.points[selection.point] ?? null;
};

/** The command that moves what is picked out. */
export const moveCommand = (chart: string, selection: Selection, to: Px): Command =>
  selection.kind === 'mark'
    ? { type: 'moveMark', chart, mark: selection.mark, to }
    : { type: 'movePoint', chart, curve: selection.curve, point: selection.point, to };

/** The command that removes what is picked out. */
export const removeCommand = (chart: string, selection: Selection): Command =>
  selection.kind === 'mark'
    ? { type: 'removeMark', chart, mark: selection.mark }
    : { type: 'removePoint', chart, curve: selection.curve, point: selection.point };

const NUDGES: Readonly<Record<string, Px>> = { ArrowLeft: [-1, 0], ArrowRight: [1, 0], ArrowUp: [0, -1], ArrowDown: [0, 1] };

/** How far an arrow key moves, in source pixels: 1, with Shift 10, with Alt 0.1; null for any other key. */
export const nudgeOf = (key: string, held: { readonly shift: boolean; readonly alt: boolean }): Px | null => {
  const nudge = NUDGES[key];
  const size = held.shift ? 10 : held.alt ? 0.1 : 1;
  return nudge ? [nudge[0] * size, nudge[1] * size] : null;
};
