/** Says things to screen readers without moving focus: the last of a run of messages, once they pause. */
export interface Announcer {
  readonly say: (message: string) => void;
  readonly subscribe: (listener: () => void) => () => void;
  readonly message: () => string;
}

const PAUSE_MS = 500;

export function createAnnouncer(): Announcer {
  let message = '';
  let timer: ReturnType<typeof setTimeout> | undefined;
  const listeners = new Set<() => void>();
  return {
    say: (next) => {
      clearTimeout(timer);
      timer = setTimeout(() => {
        // A trailing no-break space makes the same sentence twice a change that is spoken again.
        message = next === message ? `${next}\u00A0` : next;
        for (const listener of listeners) listener();
      }, PAUSE_MS);
    },
    subscribe: (listener) => {
      listeners.add(listener);
      return () => listeners.delete(listener);
    },
    message: () => message,
  };
}
