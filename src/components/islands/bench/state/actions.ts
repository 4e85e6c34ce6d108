import {
  curveName,
  emptyChart,
  emptyCurve,
  findChart,
  findCurve,
  insertionIndex,
  moveCommand,
  nextId,
  placeOfSelection,
  removeCommand,
  type BenchChart,
  type Selection,
} from '@/lib/editor';
import type { Px } from '@/lib/geometry';
import { placeWords } from '../points/words';
import type { BenchPage, BenchTools } from './tools';

const now = ({ store }: BenchTools) => {
  const { history, session } = store.get();
  return { document: history.present, session, chart: findChart(history.present, session.chart) };
};

/** What is picked out, in words: "Mark 2", "Point 7 of the 1.4 A curve". */
export const selectionName = (chart: BenchChart, selection: Selection): string => {
  if (selection.kind === 'mark') return `Mark ${chart.marks.findIndex((mark) => mark.id === selection.mark) + 1}`;
  const curve = findCurve(chart, selection.curve);
  return `Point ${selection.point + 1} of ${curve ? (curve.value === null ? curveName(chart, curve) : `the ${curveName(chart, curve)} curve`) : 'the curve'}`;
};

/** A new chart on a page picture, in hand at the first station. */
export const addChart = ({ store }: BenchTools, { picture }: BenchPage): void => {
  const id = nextId(store.get().history.present, 'c');
  store.perform({ type: 'addChart', chart: emptyChart(id, picture) });
  store.go({ type: 'chart', chart: id });
  store.go({ type: 'station', station: 'chart' });
};

const placeMark = ({ store }: BenchTools, chart: BenchChart, px: Px): void => {
  const id = nextId(store.get().history.present, 'm');
  store.perform({ type: 'addMark', chart: chart.id, mark: { id, px, x: null, y: null } });
  store.go({ type: 'select', selection: { kind: 'mark', mark: id } });
};

const placePoint = (tools: BenchTools, chart: BenchChart, px: Px, at?: number): void => {
  const { store } = tools;
  const { document, session } = now(tools);
  const curve = findCurve(chart, session.curve);
  const id = curve?.id ?? nextId(document, 'k');
  const point = at ?? insertionIndex(curve?.points ?? [], px);
  const place = { type: 'addPoint', chart: chart.id, curve: id, px, at: point } as const;
  if (curve) store.perform(place);
  else store.together([{ type: 'addCurve', chart: chart.id, curve: emptyCurve(id) }, place], 'place point');
  store.go({ type: 'select', selection: { kind: 'point', curve: id, point } });
};

/** Places a mark or a point of the curve in hand, as the station asks, and picks it out. A place outside the picture places nothing. */
export const placeAt = (tools: BenchTools, px: Px, at?: number): boolean => {
  const { session, chart } = now(tools);
  if (!chart || tools.frozen || px[0] < 0 || px[1] < 0 || px[0] > chart.width || px[1] > chart.height) return false;
  if (session.station === 'frame') placeMark(tools, chart, px);
  else if (session.station === 'curves') placePoint(tools, chart, px, at);
  else return false;
  announceSelection(tools, 'placed');
  return true;
};

/** Says what is picked out and where it is. */
export const announceSelection = (tools: BenchTools, done = ''): void => {
  const { session, chart } = now(tools);
  const px = placeOfSelection(chart, session.selection);
  if (!chart || !px || !session.selection) return;
  tools.announcer.say(`${selectionName(chart, session.selection)}${done && ` ${done}`}: ${placeWords(chart, px)}`);
};

/** Moves what is picked out to a place, as a step of its own. */
export const moveSelectedTo = (tools: BenchTools, to: Px, selection = now(tools).session.selection): void => {
  const { chart } = now(tools);
  if (!chart || !selection) return;
  tools.store.perform(moveCommand(chart.id, selection, to));
  tools.store.go({ type: 'select', selection });
  announceSelection(tools, 'moved');
};

/** Moves what is picked out by so many source pixels; a run of these is one step. */
export const nudgeSelected = (tools: BenchTools, [dx, dy]: Px): void => {
  const { session, chart } = now(tools);
  const px = placeOfSelection(chart, session.selection);
  if (!chart || !px || !session.selection) return;
  tools.store.run(
    moveCommand(chart.id, session.selection, [px[0] + dx, px[1] + dy]),
    session.selection.kind === 'mark' ? 'move mark' : 'move point',
  );
  const after = placeOfSelection(now(tools).chart, session.selection);
  if (after) tools.stage.reveal(after);
  announceSelection(tools);
};

/** Removes what is picked out; the next point is picked out in its place. */
export const removeSelected = (tools: BenchTools): void => {
  const { session, chart } = now(tools);
  if (!chart || !session.selection || tools.frozen) return;
  const name = selectionName(chart, session.selection);
  tools.store.perform(removeCommand(chart.id, session.selection));
  tools.announcer.say(`${name} removed`);
};

/** Picks out the next or the previous point or mark. */
export const stepSelection = (tools: BenchTools, by: 1 | -1): void => {
  tools.store.go({ type: 'step', by });
  const { session, chart } = now(tools);
  const px = placeOfSelection(chart, session.selection);
  if (px) tools.stage.reveal(px);
  announceSelection(tools);
};

/** Places a point after the one picked out: halfway to the next, or ten pixels to the right of the last. */
export const insertAfterSelected = (tools: BenchTools): boolean => {
  const { session, chart } = now(tools);
  if (session.selection?.kind !== 'point') return false;
  const points = findCurve(chart, session.selection.curve)?.points ?? [];
  const [here, next] = [points[session.selection.point], points[session.selection.point + 1]];
  if (!here) return false;
  const px: Px = next ? [(here[0] + next[0]) / 2, (here[1] + next[1]) / 2] : [here[0] + 10, here[1]];
  return placeAt(tools, px, session.selection.point + 1);
};

/** A new curve without points, in hand. */
export const addCurve = ({ store }: BenchTools, chart: BenchChart, value: number | null): void => {
  const id = nextId(store.get().history.present, 'k');
  store.perform({ type: 'addCurve', chart: chart.id, curve: emptyCurve(id, value) });
  store.go({ type: 'curve', curve: id });
};
