import { createContext, useContext, useSyncExternalStore } from 'react';
import type { PageView, PictureView, ReadingView } from '@/lib/contracts';
import { findChart, findCurve, type BenchChart, type BenchCurve } from '@/lib/editor';
import type { Announcer } from './announcer';
import type { Saver } from './saver';
import type { BenchState, BenchStore } from './store';
import type { UnsavedStore } from './unsaved';
import type { StageView } from '../stage/stage-view';

/** A page picture of the sheets that this reading may use. */
export interface BenchPage {
  readonly picture: PictureView;
  readonly label: string;
  readonly sheet: string;
}

/** What every part of the bench works with; made once for a page load. */
export interface BenchTools {
  readonly reading: ReadingView;
  /** Names this page load. */
  readonly tab: string;
  readonly pages: readonly BenchPage[];
  readonly store: BenchStore;
  readonly saver: Saver;
  readonly unsaved: UnsavedStore;
  readonly stage: StageView;
  readonly announcer: Announcer;
  /** Nothing may be changed: the reading has been handed in, or is somebody else's. */
  readonly frozen: boolean;
}

export const ToolsContext = createContext<BenchTools | null>(null);

export function useTools(): BenchTools {
  const tools = useContext(ToolsContext);
  if (!tools) throw new Error('useTools outside the bench');
  return tools;
}

/** A part of the state of the bench; `select` must give the same object while nothing changes. */
export function useBench<T>(select: (state: BenchState) => T): T {
  const { store } = useTools();
  return useSyncExternalStore(store.subscribe, () => select(store.get()));
}

const chartOf = ({ history, session }: BenchState): BenchChart | null => findChart(history.present, session.chart);

/** The chart in hand. */
export const useChart = (): BenchChart | null => useBench(chartOf);

/** The curve in hand. */
export const useCurve = (): BenchCurve | null => useBench((state) => findCurve(chartOf(state), state.session.curve));

export const useSession = () => useBench((state) => state.session);

export const useSaveState = () => {
  const { saver } = useTools();
  return useSyncExternalStore(saver.subscribe, saver.state);
};

/** Every page of the sheets, the reading's own sheet first; a picture that several sheets hold stands there once. */
export const pagesOf = (reading: ReadingView): readonly BenchPage[] => {
  const pages = reading.sheets.flatMap((sheet) =>
    sheet.pages.map((page: PageView) => ({ picture: page.picture, label: page.label, sheet: sheet.number || sheet.title })),
  );
  return pages.filter(({ picture }, index) => pages.findIndex((page) => page.picture.id === picture.id) === index);
};
