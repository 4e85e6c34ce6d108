import { ask } from '@/components/islands/api';
import { showState } from '@/components/islands/shared/state-chip';
import type { ReadingView, SaveAnswer } from '@/lib/contracts';
import { StageView } from '../stage/stage-view';
import { createAnnouncer } from './announcer';
import { Saver, type SaverSeams } from './saver';
import { createBenchStore } from './store';
import { pagesOf, type BenchTools } from './tools';
import { unsavedStore, type UnsavedStore } from './unsaved';

const seams = (readingId: number, tab: string, unsaved: UnsavedStore): SaverSeams => ({
  put: async (document, version) => {
    const { data } = await ask<SaveAnswer>(`/api/readings/${readingId}`, { method: 'PUT', body: { document }, ifMatch: `"${version}"` });
    showState(STATE_CHIP, 'draft'); // what was returned is a draft from its first change on
    return data;
  },
  keep: (document, version) => unsaved.keep({ readingId, tab, version, document, at: new Date().toISOString() }),
  forget: () => unsaved.forget(readingId, tab),
  after: (milliseconds, task) => {
    const timer = setTimeout(task, milliseconds);
    return () => clearTimeout(timer);
  },
});

/** Id of what holds the chip at the head of the page. */
const STATE_CHIP = 'reading-state';

/** Everything the bench works with, wired together. */
export function makeTools(reading: ReadingView, personId: string): BenchTools {
  const frozen = !reading.may.edit;
  const tab = crypto.randomUUID();
  const unsaved = unsavedStore(personId);
  const store = createBenchStore(reading.document, frozen, reading.may.takeBack ? 'hand-in' : 'chart');
  const saver = new Saver(reading, seams(reading.id, tab, unsaved));
  return {
    reading,
    tab,
    frozen,
    unsaved,
    store,
    saver,
    pages: pagesOf(reading),
    stage: new StageView(),
    announcer: createAnnouncer(),
  };
}
