import type { ModuleFit, Observation } from '@/lib/fit';
import { toValue, type Frame, type Px } from '@/lib/geometry';
import type { ReadingChart, ReadingDocument } from './document';
import { fitReading } from './fit-reading';
import { followCurves, type Remarks } from './follow-curves';
import { framesOf, marksOf } from './frames';
import { describeModel } from './model';
import { notYet } from './not-yet';
import { observationsOf } from './observations';
import { missingPrediction, predictionOf } from './predictions';
import { PictureRefused, ReadingRefused, type Refusal } from './refused';
import { ENGINE, type ReadChart, type ReadCurve, type ReadingResult } from './result';
import { tidy } from './tidy';

/** The intake picture of an image of the document. */
export interface Picture {
  readonly width: number;
  readonly height: number;
  readonly fileSha256: string;
  readonly pixelsSha256: string;
  /** Its pixels, three bytes each, rows from the top; only following asks for them. */
  readonly rgb?: () => Promise<Uint8Array>;
}

/** What `read` needs from outside: pictures by their name in the document. */
export interface ReadingHost {
  /** Throws `PictureRefused` with a sentence when there is no such picture. */
  readonly picture: (image: string) => Promise<Picture>;
}

/** A result with the fit behind it; indices of observations and residuals are those of the document's charts, curves and points. */
export interface ReadWithFit {
  readonly result: ReadingResult;
  readonly fit: ModuleFit | null;
  readonly observations: readonly Observation[];
  readonly frames: readonly Frame[];
}

const refuse = ({ path, message }: Refusal): never => {
  throw new ReadingRefused(path, message);
};

async function pictureOf(host: ReadingHost, image: string, path: string): Promise<Picture> {
  try {
    return await host.picture(image);
  } catch (error) {
    if (error instanceof PictureRefused) throw new ReadingRefused(path, error.message);
    throw error;
  }
}

/** The picture of every chart in order; a picture that several charts share is asked for once. */
async function picturesOf({ charts }: ReadingDocument, host: ReadingHost): Promise<Picture[]> {
  const known = new Map<string, Picture>();
  const pictures: Picture[] = [];
  for (const [at, { image }] of charts.entries()) {
    const picture = known.get(image) ?? (await pictureOf(host, image, `charts[${at}].image`));
    known.set(image, picture);
    pictures.push(picture);
  }
  return pictures;
}

/** The first mark, point or start that lies outside its picture. */
function outside({ marks = [], curves = [] }: ReadingChart, { width, height }: Picture, path: string): Refusal | null {
  const isOut = ([x, y]: Px) => !(x >= 0 && y >= 0 && x <= width && y <= height);
  const message = `This pixel lies outside the picture, which is ${width} pixels wide and ${height} high.`;
  const mark = marks.findIndex(({ px }) => isOut(px));
  if (mark >= 0) return { path: `${path}.marks[${mark}].px`, message };
  for (const [at, { points = [], start, through = [] }] of curves.entries()) {
    const point = points.findIndex(isOut);
    if (point >= 0) return { path: `${path}.curves[${at}].points[${point}]`, message };
    if (start && isOut(start)) return { path: `${path}.curves[${at}].start`, message };
    const passed = through.findIndex(isOut);
    if (passed >= 0) return { path: `${path}.curves[${at}].through[${passed}]`, message };
  }
  return null;
}

function readCurves(chart: ReadingChart, frame: Frame, remarks: readonly (Remarks | null)[]): ReadCurve[] {
  return (chart.curves ?? []).map(({ value, by = 'hand', points = [] }, at) => ({
    value,
    by,
    points: points.map((px) => {
      const [x, y] = toValue(frame, px);
      return { px, x: tidy(x), y: tidy(y) };
    }),
    gaps: remarks[at]?.gaps ?? [],
    doubts: remarks[at]?.doubts ?? [],
  }));
}

function readChart(
  chart: ReadingChart,
  frame: Frame,
  { fileSha256, pixelsSha256 }: Picture,
  remarks: readonly (Remarks | null)[],
): ReadChart {
  const residualPx = frame.residualPx === null ? null : tidy(frame.residualPx);
  return {
    image: chart.image,
    fileSha256,
    pixelsSha256,
    frame: { kind: frame.kind, marks: marksOf(chart), residualPx },
    curves: readCurves(chart, frame, remarks),
  };
}

/**
 * Reads a document that `parseReadingDocument` let through: frames from the marks, curves followed from their starts, values of all points, the model, the predictions.
 * The same document and pictures give the same result to the last bit. Throws {@link ReadingRefused} with the place in the document and a sentence.
 */
export async function readWithFit(asked: ReadingDocument, host: ReadingHost): Promise<ReadWithFit> {
  const unable = notYet(asked);
  if (unable) return refuse(unable);
  const pictures = await picturesOf(asked, host);
  const beyond = asked.charts.map((chart, at) => outside(chart, pictures[at]!, `charts[${at}]`)).find((refusal) => refusal !== null);
  if (beyond) return refuse(beyond);
  const framed = framesOf(asked);
  if (!framed.ok) return refuse(framed);
  const { frames } = framed;
  const { document, remarks } = await followCurves(asked, pictures);
  const [problem] = observationsOf(document, frames).problems;
  if (problem) return refuse(problem);

  const { outcome, observations, choice } = fitReading(document, frames);
  const fit = outcome.ok ? outcome.fit : null;
  const model = fit && describeModel(document, fit, observations, choice);
  const modelMissing = outcome.ok ? null : outcome.missing;
  const result: ReadingResult = {
    format: 'couplet.result',
    version: 1,
    engine: ENGINE,
    charts: document.charts.map((chart, at) => readChart(chart, frames[at]!, pictures[at]!, remarks[at]!)),
    model,
    modelMissing,
    predictions: (document.predict ?? []).map((wanted) =>
      fit && model ? predictionOf(wanted, fit, model) : missingPrediction(wanted, modelMissing ?? ''),
    ),
    checks: [],
  };
  return { result, fit, observations, frames };
}

/** Reads a document to its result; see {@link readWithFit}. */
export const read = async (document: ReadingDocument, host: ReadingHost): Promise<ReadingResult> =>
  (await readWithFit(document, host)).result;
