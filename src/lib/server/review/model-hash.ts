import type { ModelRecord } from '@db';
import { hashMaterial, type ReadingDocument, type ReadingResult } from '@/lib/reading';
import { canonicalHash } from '../hash';

/** What is stored of a model, parsed. */
export const storedModel = ({ document, result }: Pick<ModelRecord, 'document' | 'result'>) => ({
  document: JSON.parse(document) as ReadingDocument,
  result: JSON.parse(result) as ReadingResult,
});

/** The approval hash of what is stored now; it is another than the stored one when anything was changed. */
export function hashOfStored(model: Pick<ModelRecord, 'document' | 'result' | 'engine'>): string {
  const { document, result } = storedModel(model);
  const pixels = result.charts.map((chart) => chart.pixelsSha256);
  return canonicalHash(hashMaterial(document, pixels, result.model, model.engine));
}
