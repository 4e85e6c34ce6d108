/** Follows printed lines on arrays of pixels; the same on the server, in a browser's worker and in the command. */
export { colourDifference, labOf, type Lab } from './colour';
export { followLine, type FollowOptions } from './follow';
export type { Bounds, Doubt, Followed, Gap, Raster } from './types';
