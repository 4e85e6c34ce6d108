import type { Px } from '@/lib/geometry';
import type { ReadingChart } from '@/lib/reading';
import { readingChart } from './clicks';
import { finish } from './finish';
import { drawPanel } from './panel';
import type { Made, Picture } from './plan';
import type { Box } from './spots';
import type { Style } from './style';
import { page, turned } from './svg';

/** A picture file and what a careful person would read off it. */
export interface DrawnPicture {
  readonly file: string;
  readonly title: string;
  readonly bytes: Buffer;
  readonly charts: readonly ReadingChart[];
  /** Where the curves truly are, in pixels of the picture: for judging, in the order of the charts and their curves. */
  readonly lines: readonly (readonly Px[])[];
}

/** The boxes of the panels, one under the other. */
function boxesOf(count: number, { width, height, margin }: Style): readonly Box[] {
  const each = height / count;
  return Array.from({ length: count }, (_, at) => ({
    left: margin.left,
    right: width - margin.right,
    top: at * each + margin.top,
    bottom: (at + 1) * each - margin.bottom,
  }));
}

/** Draws one page: its panels, finished into a file, and each layer as a chart of a reading document. */
export async function drawPicture(made: Made, picture: Picture, sheetStyle: Style): Promise<DrawnPicture> {
  const style = picture.style ?? sheetStyle;
  const { width, height, turnDegrees, finish: kind } = style;
  const boxes = boxesOf(picture.panels.length, style);
  const panels = picture.panels.map((panel, at) => drawPanel(made, panel, style, boxes[at] as Box));
  const file = `${made.slug}-${picture.name}.${kind.file}`;
  const svg = page(width, height, style.paper, turnDegrees, panels.map((panel) => panel.svg).join(''));
  const turn = (px: Px) => turned(px, width, height, turnDegrees);
  const charts = panels.flatMap((panel) =>
    panel.layers.map((layer) =>
      readingChart(file, layerTitle(panel.panel.title, panel.layers.length, layer.layer), panel, layer, turn, turnDegrees !== 0),
    ),
  );
  const lines = panels.flatMap(({ layers }) => layers.flatMap(({ curves }) => curves.map(({ line }) => line.map(turn))));
  return { file, title: `${made.body.partNumber}: ${plain(picture.title)}`, bytes: await finish(svg, kind, file), charts, lines };
}

const ANSWERS = { Qc: 'heat', V: 'voltage', COP: 'COP' } as const;

/** A chart's title on the bench: the panel's, and which of its layers where it has several. */
const layerTitle = (title: string, layers: number, { answer, hotSideC }: Picture['panels'][number]['layers'][number]) =>
  layers > 1 ? `${ANSWERS[answer]} at ${hotSideC} °C: ${plain(title)}` : plain(title);

const plain = (title: string) => title.replaceAll('_', '');
