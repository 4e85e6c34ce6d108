import { findChart, handleAt, placeOfSelection, type Selection } from '@/lib/editor';
import type { Px } from '@/lib/geometry';
import { announceSelection, moveSelectedTo, placeAt } from '../state/actions';
import type { BenchTools } from '../state/tools';

/** How near a press must be to pick a handle out, CSS pixels, whatever the zoom. */
const REACH = { mouse: { select: 14, place: 8 }, touch: { select: 26, place: 18 } } as const;
/** A press that moves less than this is a click. */
const STILL = 3;

type Gesture =
  | { readonly kind: 'pan'; readonly last: Px; readonly moved: boolean; readonly click: boolean }
  | { readonly kind: 'press' }
  | { readonly kind: 'drag'; readonly selection: Selection; readonly from: Px; readonly grab: Px; readonly moved: boolean }
  | { readonly kind: 'pinch'; readonly ids: readonly [number, number] };

/** The parts of a pointer event that a gesture is made of. */
export interface Pointer {
  readonly id: number;
  readonly by: 'mouse' | 'touch';
  readonly button: number;
  /** On the stage, CSS pixels from its top left corner. */
  readonly at: Px;
  readonly inside: boolean;
}

/**
 * What mouse, pen and fingers do on the stage. A press places, moves or picks out when it is let go, so that it can be
 * corrected with the loupe, or given up by Esc or by letting go outside the stage; two fingers zoom and pan.
 */
export class PointerGestures {
  private gesture: Gesture | null = null;
  private readonly fingers = new Map<number, Px>();
  private panning = false;

  constructor(private readonly tools: BenchTools) {}

  /** While Space is held the next press pans. */
  holdToPan(held: boolean): void {
    this.panning = held;
  }

  down(pointer: Pointer): void {
    if (pointer.by === 'touch') this.fingers.set(pointer.id, pointer.at);
    if (this.fingers.size === 2) return this.startPinch();
    if (this.gesture) return;
    this.gesture = this.begin(pointer);
    this.aim(pointer);
  }

  move(pointer: Pointer): void {
    const { gesture } = this;
    if (gesture?.kind === 'pinch') return this.movePinch(gesture, pointer);
    if (this.fingers.has(pointer.id)) this.fingers.set(pointer.id, pointer.at);
    if (gesture?.kind === 'pan') this.movePan(gesture, pointer);
    else if (gesture?.kind === 'drag') this.moveDrag(gesture, pointer);
    this.aim(pointer);
  }

  up(pointer: Pointer): void {
    const { gesture } = this;
    this.fingers.delete(pointer.id);
    if (gesture?.kind === 'pinch') {
      if (this.fingers.size === 0) this.gesture = null;
      return;
    }
    this.gesture = null;
    const px = this.tools.stage.toPicture(pointer.at);
    if (gesture?.kind === 'press' && pointer.inside) this.press(px);
    if (gesture?.kind === 'pan' && gesture.click && !gesture.moved) this.tools.store.go({ type: 'select', selection: null });
    if (gesture?.kind === 'drag') this.drop(gesture, pointer);
    this.tools.stage.setDrag(null);
    if (pointer.by === 'touch') this.tools.stage.setAim(null);
    else this.aim(pointer);
  }

  leave(): void {
    if (!this.gesture) this.tools.stage.setAim(null);
  }

  /** Gives up what is under way and leaves no trace; false when nothing was. */
  cancel(): boolean {
    const was = this.gesture;
    this.gesture = null;
    this.fingers.clear();
    this.tools.stage.setDrag(null);
    return was !== null;
  }

  /** What the pointer would do here: shown by the shape of the cursor. */
  cursorAt(at: Px): string {
    if (this.panning || this.gesture?.kind === 'pan') return this.gesture ? 'grabbing' : 'grab';
    const { tool } = this.tools.store.get().session;
    if (this.hit(at, 'mouse')) return 'move';
    return tool === 'select' ? 'default' : 'crosshair';
  }

  private begin(pointer: Pointer): Gesture | null {
    const { session } = this.tools.store.get();
    if (pointer.button === 1 || (this.panning && pointer.button === 0))
      return { kind: 'pan', last: pointer.at, moved: false, click: false };
    if (pointer.button !== 0) return null;
    const selection = session.tool === 'target' ? null : this.hit(pointer.at, pointer.by);
    if (selection) return this.grab(selection, pointer);
    if (session.tool !== 'select' && !this.tools.frozen) return { kind: 'press' };
    return { kind: 'pan', last: pointer.at, moved: false, click: true };
  }

  private hit(at: Px, by: Pointer['by']): Selection | null {
    const { stage, store } = this.tools;
    const { history, session } = store.get();
    const reach = REACH[by][session.tool === 'place' ? 'place' : 'select'];
    return handleAt(findChart(history.present, session.chart), session, stage.toPicture(at), reach / stage.viewport().scale);
  }

  private grab(selection: Selection, pointer: Pointer): Gesture {
    const { history, session } = this.tools.store.get();
    const px = placeOfSelection(findChart(history.present, session.chart), selection) ?? [0, 0];
    const here = this.tools.stage.toPicture(pointer.at);
    this.tools.store.go({ type: 'select', selection });
    return { kind: 'drag', selection, from: pointer.at, grab: [px[0] - here[0], px[1] - here[1]], moved: false };
  }

  private press(px: Px): void {
    if (this.tools.store.get().session.tool === 'target') moveSelectedTo(this.tools, px);
    else placeAt(this.tools, px);
  }

  private drop({ selection, grab, moved }: Extract<Gesture, { kind: 'drag' }>, pointer: Pointer): void {
    const [x, y] = this.tools.stage.toPicture(pointer.at);
    if (!moved) announceSelection(this.tools, 'picked out');
    else if (pointer.inside && !this.tools.frozen) moveSelectedTo(this.tools, [x + grab[0], y + grab[1]], selection);
  }

  private moveDrag(gesture: Extract<Gesture, { kind: 'drag' }>, { at }: Pointer): void {
    const moved = gesture.moved || Math.hypot(at[0] - gesture.from[0], at[1] - gesture.from[1]) > STILL;
    this.gesture = { ...gesture, moved };
    if (!moved || this.tools.frozen) return;
    const [x, y] = this.tools.stage.toPicture(at);
    this.tools.stage.setDrag({ selection: gesture.selection, px: [x + gesture.grab[0], y + gesture.grab[1]] });
  }

  private movePan(gesture: Extract<Gesture, { kind: 'pan' }>, { at }: Pointer): void {
    const [dx, dy] = [at[0] - gesture.last[0], at[1] - gesture.last[1]];
    if (!gesture.moved && Math.hypot(dx, dy) <= STILL) return;
    this.gesture = { ...gesture, last: at, moved: true };
    this.tools.stage.pan(dx, dy);
  }

  private startPinch(): void {
    const [a, b] = [...this.fingers.keys()];
    this.tools.stage.setDrag(null);
    this.tools.stage.setAim(null);
    if (a !== undefined && b !== undefined) this.gesture = { kind: 'pinch', ids: [a, b] };
  }

  private movePinch({ ids: [a, b] }: Extract<Gesture, { kind: 'pinch' }>, pointer: Pointer): void {
    const before = [this.fingers.get(a), this.fingers.get(b)] as const;
    this.fingers.set(pointer.id, pointer.at);
    const after = [this.fingers.get(a), this.fingers.get(b)] as const;
    if (before[0] && before[1] && after[0] && after[1]) this.tools.stage.pinch([before[0], before[1]], [after[0], after[1]]);
  }

  private aim({ at, by }: Pointer): void {
    const { stage } = this.tools;
    const drag = stage.drag();
    stage.setAim({
      px: drag ? drag.px : stage.toPicture(at),
      by,
      pressed: this.gesture?.kind === 'press' || this.gesture?.kind === 'drag',
    });
  }
}
