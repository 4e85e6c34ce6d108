export type { Frame, FrameKind, FrameOutcome, Mark, Px, Scale, Scales } from './types';
