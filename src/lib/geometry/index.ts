export { frameDoubt } from './doubt';
export { fitFrame } from './fit-frame';
export { isVisible, toPixel, toValue, valueCovariance, valueJacobian, valueUncertainty, type ValueCovariance } from './map';
export { markResiduals, type MarkResidual } from './residuals';
export type { Frame, FrameKind, FrameOutcome, Mark, Px, Scale, Scales } from './types';
export { frameVariations } from './variations';
