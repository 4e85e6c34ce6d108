export { readingDocument } from './document';
export type {
  ReadingAxis,
  ReadingChart,
  ReadingCurve,
  ReadingDocument,
  ReadingFamily,
  ReadingMark,
  ReadingModule,
  ReadingPrediction,
  ReadingRating,
} from './document';
export { QUANTITIES, RATING_KEYS, UNITS, type RatingKey } from './quantities';
export { ENGINE } from './result';
export type {
  DerivedRatings,
  ReadChart,
  ReadCheck,
  ReadCurve,
  ReadDoubt,
  ReadGap,
  ReadingModel,
  ReadingResult,
  ReadPoint,
  ReadPrediction,
  Validity,
} from './result';
