/** The duty search: which modules pump a wanted heat, how they run there, and why the others do not; dew and frost point. */
export {
  coldFaceCondensation,
  condensation,
  dewPoint,
  frostPoint,
  saturationPressureHPa,
  type ColdFaceCondensation,
  type Condensation,
} from './dew-point';
export { evenCurrents, familyAtHotSide, type FamilyCurve, type FamilyPoint, type ReadValue } from './family';
export { DUTY_FIELDS, dutyTexts, parseDuty, type DutyField, type DutyParam, type DutyTexts, type ParsedDuty } from './fields';
export { missSummary } from './summary';
export { isMatch, judge, searchDuty } from './search';
export {
  MISS_KINDS,
  type Candidate,
  type CandidateModel,
  type DoubtfulValue,
  type Duty,
  type DutyMatch,
  type DutyMiss,
  type DutyNote,
  type DutyOutcome,
  type MissKind,
  type MissReason,
  type NoteKind,
  type Reach,
  type WorkingPoint,
} from './types';
