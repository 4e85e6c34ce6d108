import { useCallback, useRef } from 'react';
import type { Scene } from '@/lib/editor';
import type { Px } from '@/lib/geometry';
import { useTools } from '../state/tools';
import { drawAim, drawCurve, drawMark } from './ink';
import { useFrame } from './use-frame';

/** Free room between the loupe and what is pointed at before it changes sides, CSS pixels; a finger needs more. */
const APART = { mouse: 28, keys: 28, touch: 72 } as const;
const INSET = 12;

/** Whether a point of the stage is too near to a loupe of this size in the top right corner. */
const isBelow = ([x, y]: Px, stageWidth: number, loupe: number, apart: number): boolean =>
  x > stageWidth - loupe - INSET - apart && y < loupe + INSET + apart;

/** Source pixels a CSS pixel of the loupe shows: four times the stage, and never less than five times the picture. */
const magnification = (scale: number): number => Math.max(5, 4 * scale);

/** A round magnifier in a corner of the stage, never over what is pointed at. */
export function Loupe({ scene, image }: { scene: Scene; image: HTMLImageElement | null }) {
  const { stage } = useTools();
  const canvas = useRef<HTMLCanvasElement>(null);

  const draw = useCallback(() => {
    const element = canvas.current;
    const aim = stage.aim();
    const px = aim?.px ?? scene.selected;
    const shows =
      px !== null && image !== null && element !== null && (aim !== null || document.activeElement?.closest('[data-bench-stage]') != null);
    if (element) element.hidden = !shows;
    if (!shows) return;
    const width = element.clientWidth;
    element.dataset['side'] = isBelow(stage.toStage(px), stage.size().width, width, APART[aim?.by ?? 'keys']) ? 'left' : 'right';
    magnify(element, image, px, magnification(stage.viewport().scale), (pen, unit) => {
      for (const curve of scene.curves) drawCurve(pen, curve, curve.points, unit, false);
      for (const mark of scene.marks) drawMark(pen, mark, mark.px, unit);
      drawAim(pen, px, unit);
    });
  }, [stage, scene, image]);
  useFrame(stage, draw);

  return <canvas ref={canvas} className="bench-loupe" aria-hidden="true" hidden />;
}

function magnify(
  element: HTMLCanvasElement,
  image: HTMLImageElement,
  [x, y]: Px,
  times: number,
  overlay: (pen: CanvasRenderingContext2D, unit: number) => void,
): void {
  const ratio = devicePixelRatio;
  const size = Math.round(element.clientWidth * ratio);
  if (element.width !== size) element.width = element.height = size;
  const pen = element.getContext('2d');
  if (!pen) return;
  const scale = times * ratio;
  pen.setTransform(1, 0, 0, 1, 0, 0);
  pen.fillStyle = getComputedStyle(element).backgroundColor;
  pen.fillRect(0, 0, size, size);
  pen.setTransform(scale, 0, 0, scale, size / 2 - x * scale, size / 2 - y * scale);
  pen.imageSmoothingEnabled = false;
  const reach = size / 2 / scale + 1;
  pen.drawImage(image, x - reach, y - reach, 2 * reach, 2 * reach, x - reach, y - reach, 2 * reach, 2 * reach);
  overlay(pen, 1 / times);
}
