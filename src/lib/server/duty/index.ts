export { dutySearch, readDutyAddress } from './search';
