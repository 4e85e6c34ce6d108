import type { FrameKind, Px } from '@/lib/geometry';
import type { BenchAxis, BenchChart, BenchCurve, BenchDocument, BenchFamily, BenchMark, BenchPicture, BenchSide } from './document';
import type { ChartKind } from './kinds';

/** Everything that can change a draft. Nothing else may. Ids name what is changed; `point` is an index into a curve's points. */
export type Command =
  | { readonly type: 'addChart'; readonly chart: BenchChart }
  | { readonly type: 'removeChart'; readonly chart: string }
  | { readonly type: 'setTitle'; readonly chart: string; readonly title: string }
  | { readonly type: 'setPicture'; readonly chart: string; readonly picture: BenchPicture }
  | { readonly type: 'setKind'; readonly chart: string; readonly kind: ChartKind }
  | { readonly type: 'setAxis'; readonly chart: string; readonly axis: 'x' | 'y'; readonly to: Partial<BenchAxis> }
  | { readonly type: 'setFamily'; readonly chart: string; readonly to: Partial<BenchFamily> }
  | { readonly type: 'setSide'; readonly chart: string; readonly to: Partial<BenchSide> }
  | { readonly type: 'setFrameKind'; readonly chart: string; readonly kind: FrameKind | null }
  | { readonly type: 'addMark'; readonly chart: string; readonly mark: BenchMark }
  | { readonly type: 'moveMark'; readonly chart: string; readonly mark: string; readonly to: Px }
  | { readonly type: 'setMark'; readonly chart: string; readonly mark: string; readonly to: Partial<Pick<BenchMark, 'x' | 'y'>> }
  | { readonly type: 'removeMark'; readonly chart: string; readonly mark: string }
  | { readonly type: 'takeMarks'; readonly chart: string; readonly from: string }
  | { readonly type: 'addCurve'; readonly chart: string; readonly curve: BenchCurve }
  | { readonly type: 'setCurveValue'; readonly chart: string; readonly curve: string; readonly value: number | null }
  | { readonly type: 'removeCurve'; readonly chart: string; readonly curve: string }
  | { readonly type: 'addPoint'; readonly chart: string; readonly curve: string; readonly px: Px; readonly at?: number | undefined }
  | { readonly type: 'movePoint'; readonly chart: string; readonly curve: string; readonly point: number; readonly to: Px }
  | { readonly type: 'removePoint'; readonly chart: string; readonly curve: string; readonly point: number }
  | { readonly type: 'clearPoints'; readonly chart: string; readonly curve: string }
  | { readonly type: 'omitPoint'; readonly chart: string; readonly curve: string; readonly point: number; readonly omitted: boolean }
  | { readonly type: 'setNote'; readonly note: string }
  | { readonly type: 'replace'; readonly document: BenchDocument; readonly why: 'import' | 'theirs' | 'unsaved' };

const REPLACED = { import: 'import a reading', theirs: 'take the other version', unsaved: 'take up unsaved work' } as const;

const LABELS: Readonly<Record<Exclude<Command['type'], 'replace' | 'omitPoint'>, string>> = {
  addChart: 'add chart',
  removeChart: 'remove chart',
  setTitle: 'name chart',
  setPicture: 'change picture',
  setKind: 'set kind of chart',
  setAxis: 'set axis',
  setFamily: 'set curve family',
  setSide: 'set side',
  setFrameKind: 'set kind of frame',
  addMark: 'place mark',
  moveMark: 'move mark',
  setMark: 'set value of mark',
  removeMark: 'remove mark',
  takeMarks: 'copy marks',
  addCurve: 'add curve',
  setCurveValue: 'set value of curve',
  removeCurve: 'remove curve',
  addPoint: 'place point',
  movePoint: 'move point',
  removePoint: 'remove point',
  clearPoints: 'remove all points',
  setNote: 'write note',
};

/** What a command does, in the words that follow "Undo" on the button. */
export const label = (command: Command): string => {
  if (command.type === 'replace') return REPLACED[command.why];
  if (command.type === 'omitPoint') return command.omitted ? 'leave out point' : 'use point again';
  return LABELS[command.type];
};
