import { count } from '@/components/sheets/words';
import type { PageView, UploadAnswer } from '@/lib/contracts';
import { fileTooLarge } from '@/lib/contracts/sentences';

export type Progress =
  | { readonly is: 'waiting' }
  | { readonly is: 'sending'; readonly sentBytes: number }
  | { readonly is: 'takingIn' }
  | { readonly is: 'done'; readonly pageId: number; readonly already: UploadAnswer['already']; readonly again: boolean }
  | { readonly is: 'refused'; readonly sentence: string; readonly worthRetrying: boolean; readonly signedOut: boolean }
  | { readonly is: 'cancelled' };

export interface Upload {
  readonly key: number;
  readonly name: string;
  readonly bytes: number;
  readonly progress: Progress;
}

/** Pages of a sheet, the files on their way to it, and the last thing worth saying aloud. */
export interface UploadState {
  readonly pages: readonly PageView[];
  readonly uploads: readonly Upload[];
  readonly said: string;
  readonly nextKey: number;
  /** The largest file the server takes. */
  readonly mostBytes: number;
}

export type UploadEvent =
  | {
      readonly type: 'picked';
      readonly files: readonly { readonly name: string; readonly size: number }[];
      readonly refused?: readonly string[];
    }
  | { readonly type: 'progress'; readonly key: number; readonly sentBytes: number; readonly processing: boolean }
  | { readonly type: 'done'; readonly key: number; readonly answer: UploadAnswer }
  | { readonly type: 'refused'; readonly key: number; readonly sentence: string; readonly status: number }
  | { readonly type: 'cancelled'; readonly key: number }
  | { readonly type: 'again'; readonly key: number }
  | { readonly type: 'cleared' }
  | { readonly type: 'pages'; readonly pages: readonly PageView[] }
  | { readonly type: 'removed'; readonly pageId: number };

export const startUploads = ({ pages, mostBytes }: Pick<UploadState, 'pages' | 'mostBytes'>): UploadState => ({
  pages,
  uploads: [],
  said: '',
  nextKey: 1,
  mostBytes,
});

const SETTLED = new Set<Progress['is']>(['done', 'refused', 'cancelled']);
/** Refusals that may be over in a moment or after signing in: no answer, not signed in, too many at once, a fault of the server. */
const PASSING = (status: number) => status === 0 || status === 401 || status === 429 || status >= 500;

export const isSettled = (upload: Upload): boolean => SETTLED.has(upload.progress.is);
export const isActive = (upload: Upload): boolean => upload.progress.is === 'sending' || upload.progress.is === 'takingIn';

/** The file to send now: the first that waits, when none is on its way. */
export const nextUpload = ({ uploads }: UploadState): Upload | undefined =>
  uploads.some(isActive) ? undefined : uploads.find((upload) => upload.progress.is === 'waiting');

/** Number of a page as people count, or 0 when it is gone. */
export const pageNumber = (pages: readonly PageView[], pageId: number): number => pages.findIndex((page) => page.id === pageId) + 1;

const set = (state: UploadState, key: number, progress: Progress, said = state.said): UploadState => ({
  ...state,
  said,
  uploads: state.uploads.map((upload) => (upload.key === key ? { ...upload, progress } : upload)),
});

const find = (state: UploadState, key: number) => state.uploads.find((upload) => upload.key === key);

/** One step of the queue. The same state comes back when the event no longer concerns it. */
export function uploadStep(state: UploadState, event: UploadEvent): UploadState {
  switch (event.type) {
    case 'picked':
      return picked(state, event.files, event.refused ?? []);
    case 'progress':
      return progressed(state, event);
    case 'done':
      return taken(state, event.key, event.answer);
    case 'refused':
      return refused(state, event);
    case 'cancelled':
      return cancelled(state, event.key);
    case 'again':
      return set(state, event.key, { is: 'waiting' });
    case 'cleared':
      return { ...state, uploads: state.uploads.filter((upload) => !isSettled(upload)), said: 'The list is cleared.' };
    case 'pages':
      return { ...state, pages: event.pages };
    case 'removed':
      return { ...state, pages: state.pages.filter((page) => page.id !== event.pageId), said: 'The page is off the sheet.' };
  }
}

function picked(
  state: UploadState,
  files: readonly { readonly name: string; readonly size: number }[],
  sentences: readonly string[],
): UploadState {
  const { nextKey, mostBytes } = state;
  const tooLarge: Progress = { is: 'refused', sentence: fileTooLarge(mostBytes), worthRetrying: false, signedOut: false };
  const added = files.map(({ name, size }, at): Upload => ({
    key: nextKey + at,
    name,
    bytes: size,
    progress: size > mostBytes ? tooLarge : { is: 'waiting' },
  }));
  const waiting = added.filter((upload) => !isSettled(upload)).length;
  const refused = added.filter(isSettled).map(({ name }) => `${name} was not taken. ${fileTooLarge(mostBytes)}`);
  const said = [waiting > 0 && `${count(waiting, 'picture')} to send.`, ...refused, ...sentences].filter(Boolean).join(' ');
  return { ...state, uploads: [...state.uploads, ...added], nextKey: nextKey + files.length, said };
}

function progressed(
  state: UploadState,
  { key, sentBytes, processing }: { key: number; sentBytes: number; processing: boolean },
): UploadState {
  const upload = find(state, key);
  if (!upload || isSettled(upload)) return state;
  if (processing)
    return upload.progress.is === 'takingIn' ? state : set(state, key, { is: 'takingIn' }, `${upload.name} is sent and is being taken in.`);
  const begins = upload.progress.is === 'waiting';
  return set(state, key, { is: 'sending', sentBytes }, begins ? `Sending ${upload.name}.` : state.said);
}

function taken(state: UploadState, key: number, { page, already }: UploadAnswer): UploadState {
  const again = state.pages.some((known) => known.id === page.id);
  const pages = again ? state.pages : [...state.pages, page];
  const name = find(state, key)?.name ?? page.label;
  const number = pageNumber(pages, page.id);
  const elsewhere = already.map((sheet) => ` The same file is already on ${sheet.sheet}.`).join('');
  const said = again ? `${name} is already page ${number} of this sheet.` : `${name} is page ${number}.${elsewhere}`;
  return set({ ...state, pages }, key, { is: 'done', pageId: page.id, already, again }, said);
}

function refused(state: UploadState, { key, sentence, status }: { key: number; sentence: string; status: number }): UploadState {
  const name = find(state, key)?.name ?? 'The file';
  const progress: Progress = { is: 'refused', sentence, worthRetrying: PASSING(status), signedOut: status === 401 };
  return set(state, key, progress, `${name} was not taken. ${sentence}`);
}

function cancelled(state: UploadState, key: number): UploadState {
  const upload = find(state, key);
  return !upload || isSettled(upload) ? state : set(state, key, { is: 'cancelled' }, `${upload.name} is cancelled.`);
}
