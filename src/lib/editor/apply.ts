import type { Px } from '@/lib/geometry';
import { changed, changedById, same, withoutId } from './change';
import type { Command } from './commands';
import type { BenchChart, BenchCurve, BenchDocument } from './document';
import { findChart, nextId, roundPx } from './document';
import { kindAxes } from './kinds';
import { insertPoint, movePoint, omitPoint, removePoint } from './points';

type ChartCommand = Exclude<Command, { type: 'addChart' | 'removeChart' | 'setNote' | 'replace' | 'takeMarks' }>;
type CurveCommand = Extract<ChartCommand, { curve: string }>;

const never = (command: never): never => {
  throw new Error(`unknown command ${JSON.stringify(command)}`);
};

const applyToCurve = (curve: BenchCurve, command: CurveCommand): BenchCurve => {
  switch (command.type) {
    case 'setCurveValue':
      return changed(curve, { value: command.value });
    case 'addPoint':
      return insertPoint(curve, command.px, command.at);
    case 'movePoint':
      return movePoint(curve, command.point, command.to);
    case 'removePoint':
      return removePoint(curve, command.point);
    case 'clearPoints':
      return changed(curve, { points: [], omitted: [], by: 'hand' });
    case 'omitPoint':
      return omitPoint(curve, command.point, command.omitted);
    case 'removeCurve':
      return curve;
    default:
      return never(command);
  }
};

const withMarks = (chart: BenchChart, marks: BenchChart['marks']): BenchChart => (marks === chart.marks ? chart : { ...chart, marks });
const withCurves = (chart: BenchChart, curves: BenchChart['curves']): BenchChart =>
  curves === chart.curves ? chart : { ...chart, curves };

/** A new quantity on an axis brings its usual unit; what the axis was normalised by goes with the old quantity. */
const axisChange = <T extends { quantity: unknown; of?: unknown }>(before: T, to: Partial<T>): T =>
  changed(before, to.quantity !== undefined && to.quantity !== before.quantity && !('of' in to) ? { ...to, of: undefined } : to);

/** Nothing is placed outside the picture; a place beyond an edge comes to lie on it. */
const inside = ({ width, height }: BenchChart, [x, y]: Px): Px =>
  roundPx([Math.min(width, Math.max(0, x)), Math.min(height, Math.max(0, y))]);

/** The command with its place, if it has one, inside the picture. */
const placedInside = (chart: BenchChart, command: CurveCommand): CurveCommand => {
  if (command.type === 'addPoint') return { ...command, px: inside(chart, command.px) };
  return command.type === 'movePoint' ? { ...command, to: inside(chart, command.to) } : command;
};

const setKind = (chart: BenchChart, kind: Parameters<typeof kindAxes>[0]): BenchChart => {
  const to = kindAxes(kind);
  return changed(chart, {
    x: changed(chart.x, { ...to.x, of: undefined }),
    y: changed(chart.y, { ...to.y, of: undefined }),
    family: changed(chart.family, { ...to.family, of: undefined }),
  });
};

const applyToChart = (chart: BenchChart, command: ChartCommand): BenchChart => {
  switch (command.type) {
    case 'setTitle':
      return changed(chart, { title: command.title });
    case 'setPicture': {
      const { id, pixelsSha256, width, height } = command.picture;
      return changed(chart, { pictureId: id, pixelsSha256, width, height });
    }
    case 'setKind':
      return setKind(chart, command.kind);
    case 'setAxis':
      return changed(chart, { [command.axis]: axisChange(chart[command.axis], command.to) });
    case 'setFamily':
      return changed(chart, { family: axisChange(chart.family, command.to) });
    case 'setSide':
      return changed(chart, { side: changed(chart.side, command.to) });
    case 'setFrameKind':
      return changed(chart, { frame: command.kind });
    case 'addMark':
      return { ...chart, marks: [...chart.marks, { ...command.mark, px: inside(chart, command.mark.px) }] };
    case 'moveMark':
      return withMarks(
        chart,
        changedById(chart.marks, command.mark, (mark) => changed(mark, { px: inside(chart, command.to) })),
      );
    case 'setMark':
      return withMarks(
        chart,
        changedById(chart.marks, command.mark, (mark) => changed(mark, command.to)),
      );
    case 'removeMark':
      return withMarks(chart, withoutId(chart.marks, command.mark));
    case 'addCurve':
      return { ...chart, curves: [...chart.curves, command.curve] };
    case 'removeCurve':
      return withCurves(chart, withoutId(chart.curves, command.curve));
    default:
      return withCurves(
        chart,
        changedById(chart.curves, command.curve, (curve) => applyToCurve(curve, placedInside(chart, command))),
      );
  }
};

const takeMarks = (document: BenchDocument, to: BenchChart, fromId: string): BenchChart => {
  const from = findChart(document, fromId);
  if (!from || from === to || from.marks.length === 0) return to;
  const first = Number(nextId(document, 'm').slice(1));
  return { ...to, marks: from.marks.map((mark, index) => ({ ...mark, id: `m${first + index}` })) };
};

/**
 * The draft after a command. Pure: never changes what it is given, and gives back the same object when nothing changes.
 * A command that names a chart, mark, curve or point that is not there changes nothing.
 */
export const apply = (document: BenchDocument, command: Command): BenchDocument => {
  const withCharts = (charts: BenchDocument['charts']) => (charts === document.charts ? document : { ...document, charts });
  switch (command.type) {
    case 'addChart':
      return withCharts([...document.charts, command.chart]);
    case 'removeChart':
      return withCharts(withoutId(document.charts, command.chart));
    case 'takeMarks':
      return withCharts(changedById(document.charts, command.chart, (chart) => takeMarks(document, chart, command.from)));
    case 'setNote':
      return changed(document, { note: command.note || undefined });
    case 'replace':
      return same(document, command.document) ? document : command.document;
    default:
      return withCharts(changedById(document.charts, command.chart, (chart) => applyToChart(chart, command)));
  }
};
