import { useEffect, useId, useMemo, useRef, useState, type KeyboardEvent, type PointerEvent } from 'react';
import { chartName, view, type BenchChart, type Size } from '@/lib/editor';
import type { Px } from '@/lib/geometry';
import { useBench, useChart, useTools, type BenchPage } from '../state/tools';
import { stageKey, type KeyRequests } from './keys';
import { Layers, type FittedLine } from './Layers';
import { Loupe } from './Loupe';
import { usePicture, type LoadedPicture } from './pictures';
import { PointerGestures } from './pointer';
import { pointerOf } from './pointer-event';
import { Readout } from './Readout';
import { stageSummary } from './summary';

export interface BenchStageProps extends KeyRequests {
  readonly fitted: readonly FittedLine[];
  readonly pictureOpacity: number;
  readonly fittedOpacity: number;
  readonly toolbar: React.ReactNode;
}

/** The picture of the chart in hand with everything read from it, and all ways to point at it. */
export function BenchStage({ fitted, pictureOpacity, fittedOpacity, toolbar, ...requests }: BenchStageProps) {
  const tools = useTools();
  const chart = useChart();
  const { history, session } = useBench((state) => state);
  const scene = useMemo(() => view(history.present, session), [history.present, session]);
  const page = tools.pages.find(({ picture }) => picture.id === chart?.pictureId);
  const picture = usePicture(page?.picture.url ?? null);
  const image = picture.kind === 'ready' ? picture.image : null;
  const [size, setSize] = useState<Size | null>(null);
  const [gestures] = useState(() => new PointerGestures(tools));
  const box = useRef<HTMLDivElement>(null);
  const summary = useId();
  useStageElement(box, chart, gestures, setSize);

  const onKeyDown = (event: KeyboardEvent) => {
    if (event.target === box.current && stageKey(tools, gestures, event, requests)) event.preventDefault();
  };
  const onKeyUp = (event: KeyboardEvent) => {
    if (event.key === ' ') gestures.holdToPan(false);
  };
  const point = pointerHandlers(tools.stage, gestures);

  return (
    <section className="sheet bench-stage" aria-label="Picture" data-bench-stage>
      {toolbar}
      <div
        ref={box}
        className="bench-canvas"
        role="group"
        tabIndex={0}
        aria-label={chart ? `Picture of ${chartName(chart)}` : 'Picture'}
        aria-describedby={summary}
        aria-keyshortcuts="? [ ] + - 0 P V"
        onKeyDown={onKeyDown}
        onKeyUp={onKeyUp}
        onBlur={() => gestures.holdToPan(false)}
        {...point}
      >
        {size && (
          <Layers
            size={size}
            scene={scene}
            image={image}
            fitted={fitted}
            pictureOpacity={pictureOpacity}
            fittedOpacity={fittedOpacity}
            pointsOnly={session.station === 'model'}
          />
        )}
        {session.station !== 'chart' && <Loupe scene={scene} image={image} />}
        <StageNote>{noteOf(chart, page, picture.kind)}</StageNote>
      </div>
      <p id={summary} className="sr-only">
        {stageSummary(chart, session.station)}
      </p>
      <Readout />
    </section>
  );
}

const noteOf = (chart: BenchChart | null, page: BenchPage | undefined, picture: LoadedPicture['kind']): string => {
  if (!chart) return 'The picture of a chart stands here once a chart has been added.';
  if (picture === 'failed' || !page)
    return 'The picture of this chart cannot be shown: load the page again, or choose another page at the chart station.';
  return picture === 'loading' ? 'The picture is on its way.' : '';
};

const StageNote = ({ children }: { children: string }) => (
  <p className={children ? 'bench-note' : 'sr-only'} role="status">
    {children}
  </p>
);

/** Keeps the stage as large as its box and the view on the chart's picture; the wheel zooms about the pointer. */
function useStageElement(
  box: React.RefObject<HTMLDivElement | null>,
  chart: BenchChart | null,
  gestures: PointerGestures,
  setSize: (size: Size) => void,
): void {
  const { stage } = useTools();
  const [width, height] = [chart?.width ?? 4, chart?.height ?? 3];

  useEffect(() => {
    const element = box.current;
    if (!element) return;
    const observer = new ResizeObserver(([entry]) => {
      if (!entry) return;
      const size = { width: Math.floor(entry.contentRect.width), height: Math.floor(entry.contentRect.height) };
      stage.setStage(size);
      setSize(size);
    });
    const onWheel = (event: WheelEvent) => {
      event.preventDefault();
      const bounds = element.getBoundingClientRect();
      const about: Px = [event.clientX - bounds.left, event.clientY - bounds.top];
      const lines = event.deltaMode === WheelEvent.DOM_DELTA_LINE ? 16 : 1;
      stage.zoom(Math.exp(-event.deltaY * lines * (event.ctrlKey ? 0.01 : 0.0015)), about);
    };
    const onEscape = (event: globalThis.KeyboardEvent) => {
      if (event.key === 'Escape') gestures.cancel();
    };
    observer.observe(element);
    element.addEventListener('wheel', onWheel, { passive: false });
    window.addEventListener('keydown', onEscape);
    stage.setElement(element);
    return () => {
      observer.disconnect();
      element.removeEventListener('wheel', onWheel);
      window.removeEventListener('keydown', onEscape);
      stage.setElement(null);
    };
  }, [box, stage, gestures, setSize]);

  useEffect(() => stage.setPicture({ width, height }), [stage, chart?.pictureId, width, height]);
}

const pointerHandlers = (stage: ReturnType<typeof useTools>['stage'], gestures: PointerGestures) => ({
  onPointerDown: (event: PointerEvent<HTMLDivElement>) => {
    if (event.button === 1) event.preventDefault();
    event.currentTarget.setPointerCapture(event.pointerId);
    stage.focus();
    gestures.down(pointerOf(event));
  },
  onPointerMove: (event: PointerEvent<HTMLDivElement>) => {
    const pointer = pointerOf(event);
    gestures.move(pointer);
    event.currentTarget.style.cursor = gestures.cursorAt(pointer.at);
  },
  onPointerUp: (event: PointerEvent<HTMLDivElement>) => gestures.up(pointerOf(event)),
  onPointerCancel: () => void gestures.cancel(),
  onPointerLeave: () => gestures.leave(),
});
