export { accessOf, readingFor, readingTo } from './access';
export { ownReadings, readingView, saveReading, startReading, toReadingRow } from './drafts';
export { fitDraft, imageNames, toReadingModule, type FittedDraft } from './fit';
export { modelOf, ratingsBeside, toModelAnswer } from './model';
