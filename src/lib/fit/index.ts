/** From points read off charts to the constants of a module, with uncertainty. */
export type * from './types';
export { constantsOf } from './types';
