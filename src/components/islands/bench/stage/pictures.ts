import { useSyncExternalStore } from 'react';

/** A picture of the server on its way into the stage. */
export type LoadedPicture =
  { readonly kind: 'loading' } | { readonly kind: 'ready'; readonly image: HTMLImageElement } | { readonly kind: 'failed' };

interface Entry {
  state: LoadedPicture;
  readonly listeners: Set<() => void>;
}

const LOADING: LoadedPicture = { kind: 'loading' };
const entries = new Map<string, Entry>();

const load = (url: string): Entry => {
  const entry: Entry = { state: LOADING, listeners: new Set() };
  const image = new Image();
  const become = (state: LoadedPicture) => {
    entry.state = state;
    for (const listener of entry.listeners) listener();
    if (state.kind === 'failed') entries.delete(url);
  };
  image.decoding = 'async';
  image.onload = () => become({ kind: 'ready', image });
  image.onerror = () => become({ kind: 'failed' });
  image.src = url;
  entries.set(url, entry);
  return entry;
};

/** The picture behind a URL, loaded once for the page. */
export function usePicture(url: string | null): LoadedPicture {
  return useSyncExternalStore(
    (listener) => {
      if (url === null) return () => {};
      const entry = entries.get(url) ?? load(url);
      entry.listeners.add(listener);
      listener();
      return () => void entry.listeners.delete(listener);
    },
    () => (url === null ? LOADING : (entries.get(url)?.state ?? LOADING)),
  );
}
