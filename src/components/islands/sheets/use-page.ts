import { useEffect, useSyncExternalStore, type RefObject } from 'react';

const ERROR = 'Error: ';

/** Says first in the title of the page that a form was refused. */
export function useErrorTitle(refused: boolean): void {
  useEffect(() => {
    if (!refused) return;
    document.title = ERROR + document.title;
    return () => {
      document.title = document.title.replace(ERROR, '');
    };
  }, [refused]);
}

/** Asks before the page is left while something is unfinished; `done` lets go at once. */
export function useLeaveGuard(unfinished: boolean, done?: RefObject<boolean>): void {
  useEffect(() => {
    if (!unfinished) return;
    const ask = (event: BeforeUnloadEvent) => {
      if (!done?.current) event.preventDefault();
    };
    window.addEventListener('beforeunload', ask);
    return () => window.removeEventListener('beforeunload', ask);
  }, [unfinished, done]);
}

const FRAMES_TO_WAIT = 10;

/** Moves the keyboard to an element that the next drawings of the page bring. */
export function focusSoon(id: string, frames = FRAMES_TO_WAIT): void {
  requestAnimationFrame(() => {
    const element = document.getElementById(id);
    if (element) element.focus();
    else if (frames > 0) focusSoon(id, frames - 1);
  });
}

const never = () => () => undefined;

/** False as drawn on the server, true once the page listens. */
export const useAwake = (): boolean =>
  useSyncExternalStore(
    never,
    () => true,
    () => false,
  );
