import { denominatorAt, projectionOfFrame } from './projection';
import type { Frame, Mark, Px } from './types';

/** A flat page photographed by hand has far and near edges within this ratio; common practice, no source. */
const STEEPEST = 2;
/** Marks placed with care lie nearer to their lines than this, px. */
const LARGE_RESIDUAL_PX = 3;

/**
 * One sentence when a fitted frame is unlikely to be what was meant, else null: marks far from their value lines, or a perspective so steep
 * that a mistyped value explains it better (four corners always determine a perspective, so their residual cannot tell).
 */
export function frameDoubt(frame: Frame, marks: readonly Mark[]): string | null {
  if (frame.residualPx !== null && frame.residualPx > LARGE_RESIDUAL_PX) {
    return `The marks lie ${frame.residualPx.toFixed(1)}\u00A0px from the lines of their values: check the values typed and the places of the marks.`;
  }
  const projection = projectionOfFrame(frame);
  const sizes = marks.map(({ px }) => denominatorAt(projection, [px[0] - frame.origin[0], px[1] - frame.origin[1]] satisfies Px));
  return Math.max(...sizes) > STEEPEST * Math.min(...sizes)
    ? 'One edge of the page would be more than twice as far away as the other: check the values typed and the places of the marks.'
    : null;
}
