import type { PointerEvent } from 'react';
import type { Px } from '@/lib/geometry';
import type { Pointer } from './pointer';

/**
 * A mouse reports whole device pixels by their corner, and what is pointed at is the middle of the pixel: half a device
 * pixel further. A position between device pixels, as pens, fingers and zoomed pages report, is exact already.
 */
const pointed = (client: number, mouse: boolean): number => {
  const device = client * devicePixelRatio;
  return mouse && Math.abs(device - Math.round(device)) < 1e-3 ? client + 0.5 / devicePixelRatio : client;
};

/** A pointer event as a place on the element that listens. */
export const pointerOf = (event: PointerEvent<HTMLElement>): Pointer => {
  const box = event.currentTarget.getBoundingClientRect();
  const mouse = event.pointerType === 'mouse';
  const at: Px = [pointed(event.clientX, mouse) - box.left, pointed(event.clientY, mouse) - box.top];
  const inside = at[0] >= 0 && at[1] >= 0 && at[0] <= box.width && at[1] <= box.height;
  return { id: event.pointerId, by: mouse ? 'mouse' : 'touch', button: event.button, at, inside };
};
