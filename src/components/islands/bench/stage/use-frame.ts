import { useEffect } from 'react';
import type { StageView } from './stage-view';

/** Runs `draw` in the next frame after anything on the stage has moved, and whenever `draw` itself is another. */
export function useFrame(stage: StageView, draw: () => void): void {
  useEffect(() => {
    let frame = 0;
    const ask = () => {
      cancelAnimationFrame(frame);
      frame = requestAnimationFrame(draw);
    };
    ask();
    const end = stage.subscribe(ask);
    return () => {
      end();
      cancelAnimationFrame(frame);
    };
  }, [stage, draw]);
}
