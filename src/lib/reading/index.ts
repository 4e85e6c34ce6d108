/** From what a person told the program about a module's charts to values, model and predictions; the same on the server, in a browser and in the command. */
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
export { familyCurves, type FamilyCurve } from './family';
export { fitReading, type FittedReading } from './fit-reading';
export { framesOf, marksOf, type FramesOutcome } from './frames';
export { hashMaterial, type HashMaterial } from './hash-material';
export { constantsOfModel, moduleOf, toleranceOf } from './model';
export { observationsOf, POINT_UNCERTAINTY_PX, type Observations } from './observations';
export { parseReadingDocument, type ParsedDocument } from './parse';
export { QUANTITIES, RATING_KEYS, UNITS, type RatingKey } from './quantities';
export { read, readWithFit, type Picture, type ReadingHost, type ReadWithFit } from './read';
export { PictureRefused, ReadingRefused, type Refusal } from './refused';
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
export { rolesOf, type ChartQuantities, type ChartRoles, type Place, type RolesOutcome } from './roles';
