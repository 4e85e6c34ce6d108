/** The draft of a reading as plain data: what can change it, its history, what is drawn of it and what it still misses. */
export * from './document';
export { CHART_KINDS, kindAxes, kindOf, ratingOf, usualUnit, type ChartKind } from './kinds';
export { label, type Command } from './commands';
export { apply } from './apply';
export { insertionIndex } from './points';
export { HISTORY_LIMIT, historyReducer, redoLabel, startHistory, undoLabel } from './history';
export type { History, HistoryAction, HistoryRules, Step } from './history';
export { benchDocument } from './schema';
export { frameOf, placeOf, readyFrame, unitsPerPixel, valueAt } from './frame';
export { chartName, chartState, curveName, isFinished, problemsOf, progressOf, type ChartProblem, type ChartState } from './state';
export { compareDocuments, sameDocument, tallyOf, type ChartDifference, type ChartTally } from './compare';
export { fromReadingDocument, toReadingDocument, type ChartOrigin, type Conversion, type Imported } from './convert';
export * from './session';
export { handleAt, view, type Scene, type SceneCurve, type SceneMark } from './view';
export * from './viewport';
