import { useEffect, useEffectEvent, useRef, type RefObject } from 'react';
import { formTexts, sameTexts, type Texts } from './address';

const PAUSE_MS = 250;

/**
 * Takes what stands in a plain form as it is typed, after a short pause, and at once when it is sent. What was typed before
 * the page listened (or what the browser put back) is taken when it starts to.
 */
export function useLiveForm(form: RefObject<HTMLFormElement | null>, texts: Texts, take: (texts: Texts) => void) {
  const timer = useRef<ReturnType<typeof setTimeout>>(undefined);

  const takeNow = useEffectEvent(() => {
    if (!form.current) return;
    const now = formTexts(form.current);
    if (!sameTexts(now, texts)) take(now);
  });
  const pending = useRef<() => void>(undefined);

  useEffect(() => {
    pending.current = () => takeNow();
    takeNow();
    return () => clearTimeout(timer.current);
  }, []);

  const onInput = () => {
    clearTimeout(timer.current);
    timer.current = setTimeout(() => pending.current?.(), PAUSE_MS);
  };
  const onSubmit = (event: { preventDefault: () => void }) => {
    event.preventDefault();
    clearTimeout(timer.current);
    pending.current?.();
  };
  return { onInput, onSubmit };
}
