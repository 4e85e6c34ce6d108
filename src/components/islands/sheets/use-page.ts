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

/** Moves the keyboard to an element once the page has been drawn again. */
export const focusSoon = (id: string): void => {
  requestAnimationFrame(() => document.getElementById(id)?.focus());
};

const never = () => () => undefined;

/** False as drawn on the server, true once the page listens. */
export const useAwake = (): boolean =>
  useSyncExternalStore(
    never,
    () => true,
    () => false,
  );
