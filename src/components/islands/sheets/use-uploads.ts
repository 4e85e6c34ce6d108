import { useCallback, useEffect, useReducer, useRef } from 'react';
import { api, ApiProblem, sendForm } from '@/components/islands/api';
import type { PageView, SheetView, UploadAnswer } from '@/lib/contracts';
import { isActive, nextUpload, startUploads, uploadStep, type Upload, type UploadEvent, type UploadState } from './upload-state';

export interface Uploads {
  readonly state: UploadState;
  readonly add: (files: readonly File[], refused?: readonly string[]) => void;
  readonly cancel: (upload: Upload) => void;
  readonly again: (upload: Upload) => void;
  readonly clear: () => void;
  readonly removed: (pageId: number) => void;
}

/** The server finishes a page that it had begun to write when the answer was no longer wanted. */
const AFTER_CANCEL_MS = 600;

/** Sends files to a sheet one after the other. */
export function useUploads(sheetId: number, pages: readonly PageView[], mostBytes: number): Uploads {
  const [state, dispatch] = useReducer(uploadStep, { pages, mostBytes }, startUploads);
  const files = useRef(new Map<number, File>());
  const running = useRef<{ readonly key: number; readonly stop: AbortController } | null>(null);

  const send = useCallback(
    async ({ key, bytes }: Upload, file: File) => {
      const stop = new AbortController();
      running.current = { key, stop };
      dispatch({ type: 'progress', key, sentBytes: 0, processing: false });
      const settled = await sendFile(sheetId, file, key, stop.signal, (sentBytes, processing) =>
        dispatch({ type: 'progress', key, sentBytes: Math.min(sentBytes, bytes), processing }),
      );
      running.current = null;
      dispatch(settled);
      if (settled.type === 'cancelled') setTimeout(() => void refresh(sheetId, dispatch), AFTER_CANCEL_MS);
    },
    [sheetId],
  );

  useEffect(() => {
    const upload = nextUpload(state);
    const file = upload && files.current.get(upload.key);
    if (upload && file && !running.current) void send(upload, file);
  }, [state, send]);

  return {
    state,
    add: (picked, refused = []) => {
      picked.forEach((file, at) => files.current.set(state.nextKey + at, file));
      dispatch({ type: 'picked', files: picked, refused });
    },
    cancel: (upload) => {
      if (isActive(upload)) running.current?.stop.abort();
      else dispatch({ type: 'cancelled', key: upload.key });
    },
    again: ({ key }) => dispatch({ type: 'again', key }),
    clear: () => dispatch({ type: 'cleared' }),
    removed: (pageId) => dispatch({ type: 'removed', pageId }),
  };
}

async function sendFile(
  sheetId: number,
  file: File,
  key: number,
  signal: AbortSignal,
  onProgress: (sentBytes: number, processing: boolean) => void,
): Promise<UploadEvent> {
  const form = new FormData();
  form.append('file', file, file.name);
  try {
    const answer = await sendForm<UploadAnswer>(`/api/sheets/${sheetId}/pages`, form, {
      signal,
      onProgress: ({ sentBytes, processing }) => onProgress(sentBytes, processing),
    });
    return { type: 'done', key, answer };
  } catch (error) {
    if (signal.aborted) return { type: 'cancelled', key };
    if (error instanceof ApiProblem) return { type: 'refused', key, sentence: error.detail, status: error.status };
    return { type: 'refused', key, sentence: 'The file could not be read. Choose it again.', status: 0 };
  }
}

async function refresh(sheetId: number, dispatch: (event: UploadEvent) => void): Promise<void> {
  const sheet = await api.get<SheetView>(`/api/sheets/${sheetId}`).catch(() => null);
  if (sheet) dispatch({ type: 'pages', pages: sheet.pages });
}
