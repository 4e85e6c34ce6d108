import { useCallback, useEffect, useState } from 'react';
import { addressOf, textsOf, type Texts } from './address';

/** How an address changes: a step one can go back from, or the same step seen anew. */
export type Step = 'push' | 'replace';

/** Keeps what a page shows in its address. `generation` grows when the browser goes back or on, so that fields are drawn again. */
export function useAddress(path: string, initial: Texts) {
  const [{ texts, generation }, setState] = useState({ texts: initial, generation: 0 });

  useEffect(() => {
    const back = () => setState((now) => ({ texts: textsOf(window.location.search), generation: now.generation + 1 }));
    window.addEventListener('popstate', back);
    return () => window.removeEventListener('popstate', back);
  }, []);

  const go = useCallback(
    (next: Texts, step: Step, redraw = false) => {
      history[step === 'push' ? 'pushState' : 'replaceState'](null, '', addressOf(path, next));
      setState((now) => ({ texts: next, generation: redraw ? now.generation + 1 : now.generation }));
    },
    [path],
  );
  return { texts, generation, go };
}
