export { accessOf, readingFor, readingTo } from './access';
export { ownReadings, readingView, saveReading, startReading, toReadingRow } from './drafts';
