import { useEffect } from 'react';
import type { BenchTools } from './tools';

const inText = (target: EventTarget | null): boolean =>
  target instanceof HTMLElement &&
  (target.isContentEditable || target.matches('input:not([type=range]):not([type=checkbox]):not([type=radio]), textarea, select'));

/** Undo and redo everywhere but in text fields, which keep their own. */
export function useUndoKeys({ store }: BenchTools): void {
  useEffect(() => {
    const onKey = (event: KeyboardEvent) => {
      if (!(event.ctrlKey || event.metaKey) || event.altKey || inText(event.target)) return;
      const key = event.key.toLowerCase();
      const redo = key === 'y' || (key === 'z' && event.shiftKey);
      if (!redo && key !== 'z') return;
      event.preventDefault();
      if (redo) store.redo();
      else store.undo();
    };
    window.addEventListener('keydown', onKey);
    return () => window.removeEventListener('keydown', onKey);
  }, [store]);
}

/** Saves every change; warns before the page goes only while something is unsaved; tries again when the person comes back. */
export function useSaving({ store, saver, frozen }: BenchTools): void {
  useEffect(() => {
    if (frozen) return;
    const guard = (event: BeforeUnloadEvent) => event.preventDefault();
    const onSaver = () => {
      if (saver.unsaved()) window.addEventListener('beforeunload', guard);
      else window.removeEventListener('beforeunload', guard);
    };
    const onStore = () => {
      saver.changed(store.get().history.present);
      onSaver();
    };
    const onVisible = () => {
      const { kind } = saver.state();
      if (document.visibilityState === 'hidden' || kind === 'signedOut' || kind === 'failed') void saver.flush();
    };
    const ends = [store.subscribe(onStore), saver.subscribe(onSaver)];
    document.addEventListener('visibilitychange', onVisible);
    window.addEventListener('online', onVisible);
    return () => {
      for (const end of ends) end();
      document.removeEventListener('visibilitychange', onVisible);
      window.removeEventListener('online', onVisible);
      window.removeEventListener('beforeunload', guard);
    };
  }, [store, saver, frozen]);
}
