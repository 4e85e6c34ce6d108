import type { Px } from '@/lib/geometry';
import { followLine, type Doubt, type Gap } from '@/lib/trace';
import type { ReadingChart, ReadingCurve, ReadingDocument } from './document';
import type { Picture } from './read';
import { ReadingRefused } from './refused';

/** What following said about a curve beside its points. */
export interface Remarks {
  readonly gaps: readonly Gap[];
  readonly doubts: readonly Doubt[];
}

/** A document whose curves all have points, and the remarks on each followed curve by chart and curve; null for a curve that had its points. */
export interface FollowedDocument {
  readonly document: ReadingDocument;
  readonly remarks: readonly (readonly (Remarks | null)[])[];
}

/** A ten thousandth of a pixel: far below what any picture holds, and the same bytes everywhere. */
const rounded = ([x, y]: Px): Px => [Math.round(x * 1e4) / 1e4, Math.round(y * 1e4) / 1e4];

const roundedRemarks = (gaps: readonly Gap[], doubts: readonly Doubt[]): Remarks => ({
  gaps: gaps.map((gap) => ({ ...gap, from: rounded(gap.from), to: rounded(gap.to) })),
  doubts: doubts.map((doubt) => ({ ...doubt, px: rounded(doubt.px) })),
});

const needsFollowing = ({ points }: ReadingCurve) => points === undefined;

function followCurve(curve: ReadingCurve, picture: Picture, rgb: Uint8Array, path: string): { curve: ReadingCurve; remarks: Remarks } {
  const { width, height } = picture;
  const followed = followLine({ width, height, rgb }, curve.start!, { through: curve.through });
  if (!followed.ok) throw new ReadingRefused(`${path}.start`, followed.message);
  return {
    curve: { ...curve, by: 'followed', points: followed.points.map(rounded) },
    remarks: roundedRemarks(followed.gaps, followed.doubts),
  };
}

async function followChart(chart: ReadingChart, picture: Picture, path: string) {
  const curves = chart.curves ?? [];
  if (!curves.some(needsFollowing)) return { chart, remarks: curves.map(() => null) };
  if (!picture.rgb)
    throw new ReadingRefused(
      `${path}.image`,
      'The pixels of this picture are not at hand, so no curve can be followed on it: give its curves as points.',
    );
  const rgb = await picture.rgb();
  const done = curves.map((curve, at) =>
    needsFollowing(curve) ? followCurve(curve, picture, rgb, `${path}.curves[${at}]`) : { curve, remarks: null },
  );
  return { chart: { ...chart, curves: done.map(({ curve }) => curve) }, remarks: done.map(({ remarks }) => remarks) };
}

/**
 * Follows every curve that is given by a start, on the picture of its chart (`pictures` in the order of the charts).
 * Throws {@link ReadingRefused} at a start, or at the image whose pixels are not at hand.
 */
export async function followCurves(document: ReadingDocument, pictures: readonly Picture[]): Promise<FollowedDocument> {
  const done: Awaited<ReturnType<typeof followChart>>[] = [];
  for (const [at, chart] of document.charts.entries()) done.push(await followChart(chart, pictures[at]!, `charts[${at}]`));
  return { document: { ...document, charts: done.map(({ chart }) => chart) }, remarks: done.map(({ remarks }) => remarks) };
}
