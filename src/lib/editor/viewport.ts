import type { Px } from '@/lib/geometry';

/** Where the picture lies on the stage: stage point = scale · picture point + offset, in CSS pixels. */
export interface Viewport {
  readonly scale: number;
  readonly x: number;
  readonly y: number;
}

/** Width and height, in CSS pixels for a stage and in source pixels for a picture. */
export interface Size {
  readonly width: number;
  readonly height: number;
}

/** Paper kept free around the fitted picture, CSS pixels. */
export const FIT_MARGIN = 16;

/** Stage pixels per source pixel that a person may zoom to. */
export const SCALES = { least: 0.02, most: 40 } as const;

/** One press of the zoom keys or buttons. */
export const ZOOM_STEP = 1.25;

const clampScale = (scale: number): number => Math.min(SCALES.most, Math.max(SCALES.least, scale));

/** The whole picture in the middle of the stage, with `FIT_MARGIN` free on the tighter side. */
export const fitViewport = (picture: Size, stage: Size): Viewport => {
  const room = (available: number, needed: number) => Math.max(1, available - 2 * FIT_MARGIN) / Math.max(1, needed);
  const scale = clampScale(Math.min(room(stage.width, picture.width), room(stage.height, picture.height)));
  return { scale, x: (stage.width - scale * picture.width) / 2, y: (stage.height - scale * picture.height) / 2 };
};

/** A place on the picture as a point on the stage. */
export const toStage = ({ scale, x, y }: Viewport, px: Px): Px => [scale * px[0] + x, scale * px[1] + y];

/** A point on the stage as a place on the picture. */
export const toPicture = ({ scale, x, y }: Viewport, point: Px): Px => [(point[0] - x) / scale, (point[1] - y) / scale];

/** Zoomed by a factor so that the picture stays put under `about`, a point on the stage. */
export const zoomAbout = (viewport: Viewport, about: Px, factor: number): Viewport => {
  const scale = clampScale(viewport.scale * factor);
  const [px, py] = toPicture(viewport, about);
  return { scale, x: about[0] - scale * px, y: about[1] - scale * py };
};

/** Moved by so many CSS pixels. */
export const pan = (viewport: Viewport, dx: number, dy: number): Viewport => ({ ...viewport, x: viewport.x + dx, y: viewport.y + dy });

/** Two fingers that move from `before` to `after`: zoomed about and moved with their middle. */
export const pinch = (viewport: Viewport, before: readonly [Px, Px], after: readonly [Px, Px]): Viewport => {
  const middle = ([a, b]: readonly [Px, Px]): Px => [(a[0] + b[0]) / 2, (a[1] + b[1]) / 2];
  const spread = ([a, b]: readonly [Px, Px]) => Math.max(1, Math.hypot(a[0] - b[0], a[1] - b[1]));
  const [from, to] = [middle(before), middle(after)];
  return pan(zoomAbout(viewport, from, spread(after) / spread(before)), to[0] - from[0], to[1] - from[1]);
};

/** The picture kept within reach: at least `keep` CSS pixels of it, or all of a smaller one, stay on the stage. */
export const keepInReach = (viewport: Viewport, picture: Size, stage: Size, keep = 48): Viewport => {
  const bound = (offset: number, length: number, room: number) => {
    const least = Math.min(keep, length);
    return Math.min(room - least, Math.max(least - length, offset));
  };
  return {
    ...viewport,
    x: bound(viewport.x, viewport.scale * picture.width, stage.width),
    y: bound(viewport.y, viewport.scale * picture.height, stage.height),
  };
};

/** Moved no more than needed for a place on the picture to lie `margin` inside the stage; the same viewport when it does. */
export const bringIntoView = (viewport: Viewport, px: Px, stage: Size, margin = 40): Viewport => {
  const [x, y] = toStage(viewport, px);
  const shift = (at: number, room: number) => {
    const free = Math.min(margin, room / 2);
    return at < free ? free - at : at > room - free ? room - free - at : 0;
  };
  const [dx, dy] = [shift(x, stage.width), shift(y, stage.height)];
  return dx === 0 && dy === 0 ? viewport : pan(viewport, dx, dy);
};
