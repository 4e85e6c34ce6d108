import {
  bringIntoView,
  fitViewport,
  keepInReach,
  pan,
  pinch,
  toPicture,
  toStage,
  zoomAbout,
  type Selection,
  type Size,
  type Viewport,
} from '@/lib/editor';
import type { Px } from '@/lib/geometry';

/** Where the pointer or the keyboard's cross-hairs point, and how. */
export interface Aim {
  readonly px: Px;
  readonly by: 'mouse' | 'touch' | 'keys';
  /** A press that places or moves something is under way. */
  readonly pressed: boolean;
}

/** A handle that is being dragged, and where it is now; the draft learns of it when it is let go. */
export interface Drag {
  readonly selection: Selection;
  readonly px: Px;
}

/**
 * What moves many times a second and is therefore kept out of React: where the picture lies on the stage, what is
 * pointed at and what is being dragged. Drawing code subscribes and redraws.
 */
export class StageView {
  private readonly listeners = new Set<() => void>();
  private picture: Size = { width: 1, height: 1 };
  private stage: Size = { width: 1, height: 1 };
  private fitted = true;
  private port: Viewport = { scale: 1, x: 0, y: 0 };
  private aimed: Aim | null = null;
  private dragged: Drag | null = null;
  private element: HTMLElement | null = null;

  readonly viewport = (): Viewport => this.port;
  readonly aim = (): Aim | null => this.aimed;
  readonly drag = (): Drag | null => this.dragged;
  readonly size = (): Size => this.stage;

  readonly subscribe = (listener: () => void): (() => void) => {
    this.listeners.add(listener);
    return () => void this.listeners.delete(listener);
  };

  /** The element that has the keys of the stage. */
  setElement(element: HTMLElement | null): void {
    this.element = element;
  }

  /** Gives the keyboard to the stage. */
  focus(): void {
    this.element?.focus({ preventScroll: true });
  }

  /** Another picture starts fitted; a stage that changes its size keeps a fitted picture fitted. */
  setPicture(picture: Size): void {
    this.picture = picture;
    this.fit();
  }

  setStage(stage: Size): void {
    this.stage = stage;
    if (this.fitted) this.fit();
    else this.show(this.port);
  }

  fit(): void {
    this.fitted = true;
    this.port = fitViewport(this.picture, this.stage);
    this.changed();
  }

  /** Zooms about a point of the stage, by default about its middle. */
  zoom(factor: number, about: Px = [this.stage.width / 2, this.stage.height / 2]): void {
    this.show(zoomAbout(this.port, about, factor));
  }

  pan(dx: number, dy: number): void {
    this.show(pan(this.port, dx, dy));
  }

  pinch(before: readonly [Px, Px], after: readonly [Px, Px]): void {
    this.show(pinch(this.port, before, after));
  }

  /** Moves no more than needed to have a place of the picture on the stage. */
  reveal(px: Px): void {
    const port = bringIntoView(this.port, px, this.stage);
    if (port !== this.port) this.show(port);
  }

  setAim(aim: Aim | null): void {
    if (aim === this.aimed) return;
    this.aimed = aim;
    this.changed();
  }

  setDrag(drag: Drag | null): void {
    if (drag === this.dragged) return;
    this.dragged = drag;
    this.changed();
  }

  toPicture(point: Px): Px {
    return toPicture(this.port, point);
  }

  toStage(px: Px): Px {
    return toStage(this.port, px);
  }

  /** The place of the picture in the middle of the stage, kept inside the picture. */
  middle(): Px {
    const [x, y] = this.toPicture([this.stage.width / 2, this.stage.height / 2]);
    return [Math.min(this.picture.width, Math.max(0, x)), Math.min(this.picture.height, Math.max(0, y))];
  }

  private show(port: Viewport): void {
    this.fitted = false;
    this.port = keepInReach(port, this.picture, this.stage);
    this.changed();
  }

  private changed(): void {
    for (const listener of this.listeners) listener();
  }
}
