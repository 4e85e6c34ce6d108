import 'konva/lib/shapes/Image.js';
import type { Layer as KonvaLayer } from 'konva/lib/Layer.js';
import type { Stage as KonvaStage } from 'konva/lib/Stage.js';
import { useCallback, useRef } from 'react';
import { Image as Picture, Layer, Shape, Stage } from 'react-konva/lib/ReactKonvaCore.js';
import type { Scene, Selection, Size, Viewport } from '@/lib/editor';
import type { Px } from '@/lib/geometry';
import { useTools } from '../state/tools';
import { drawAim, drawCurve, drawFitted, drawMark, drawSelected, type Pen } from './ink';
import type { Drag } from './stage-view';
import { useFrame } from './use-frame';

/** A line of the fitted family, drawn back over the picture. */
export interface FittedLine {
  readonly points: readonly Px[];
  readonly style: number;
}

export interface LayersProps {
  readonly size: Size;
  readonly scene: Scene;
  readonly image: HTMLImageElement | null;
  readonly fitted: readonly FittedLine[];
  readonly pictureOpacity: number;
  readonly fittedOpacity: number;
  /** At the model station points stand without their line, so that the fitted one shows. */
  readonly pointsOnly: boolean;
}

const movedPoints = (curve: Scene['curves'][number], drag: Drag | null): readonly Px[] => {
  const selection: Selection | undefined = drag?.selection;
  if (selection?.kind !== 'point' || selection.curve !== curve.id || !drag) return curve.points;
  return curve.points.map((px, index) => (index === selection.point ? drag.px : px));
};

/** Everything on the stage in three layers: the picture, the settled curves, the handles. Nothing listens: hits are found in the draft. */
export function Layers({ size, scene, image, fitted, pictureOpacity, fittedOpacity, pointsOnly }: LayersProps) {
  const { stage } = useTools();
  const konva = useRef<KonvaStage>(null);
  const picture = useRef<KonvaLayer>(null);
  const curves = useRef<KonvaLayer>(null);
  const handles = useRef<KonvaLayer>(null);
  const shown = useRef<{ port: Viewport | null; drag: Drag | null }>({ port: null, drag: null });

  const drawCurves = useCallback(
    (pen: Pen) => {
      const unit = 1 / stage.viewport().scale;
      for (const curve of [...scene.curves].sort((a, b) => Number(a.active) - Number(b.active))) {
        drawCurve(pen, curve, movedPoints(curve, stage.drag()), unit, pointsOnly);
      }
    },
    [scene, stage, pointsOnly],
  );
  const drawFamily = useCallback(
    (pen: Pen) => fitted.forEach(({ points, style }) => drawFitted(pen, points, style, 1 / stage.viewport().scale)),
    [fitted, stage],
  );
  const drawHandles = useCallback(
    (pen: Pen) => {
      const unit = 1 / stage.viewport().scale;
      const drag = stage.drag();
      for (const mark of scene.marks) {
        drawMark(pen, mark, drag?.selection.kind === 'mark' && drag.selection.mark === mark.id ? drag.px : mark.px, unit);
      }
      if (scene.selected) drawSelected(pen, drag?.px ?? scene.selected, unit);
      const aim = stage.aim();
      if (aim?.by === 'keys' || aim?.pressed) drawAim(pen, aim.px, unit);
    },
    [scene, stage],
  );

  const redraw = useCallback(() => {
    const port = stage.viewport();
    const drag = stage.drag();
    const before = shown.current;
    if (port !== before.port) {
      konva.current?.setAttrs({ x: port.x, y: port.y, scaleX: port.scale, scaleY: port.scale });
      picture.current?.imageSmoothingEnabled(port.scale < 3);
      konva.current?.batchDraw();
    } else {
      if (drag !== before.drag) curves.current?.batchDraw();
      handles.current?.batchDraw();
    }
    shown.current = { port, drag };
  }, [stage]);
  useFrame(stage, redraw);

  return (
    <Stage ref={konva} width={size.width} height={size.height} listening={false}>
      <Layer ref={picture} listening={false}>
        {image && <Picture image={image} width={image.naturalWidth} height={image.naturalHeight} opacity={pictureOpacity} />}
      </Layer>
      <Layer ref={curves} listening={false}>
        <Shape sceneFunc={drawFamily} opacity={fittedOpacity} perfectDrawEnabled={false} />
        <Shape sceneFunc={drawCurves} perfectDrawEnabled={false} />
      </Layer>
      <Layer ref={handles} listening={false}>
        <Shape sceneFunc={drawHandles} perfectDrawEnabled={false} />
      </Layer>
    </Stage>
  );
}
