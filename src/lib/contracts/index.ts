export * from './admin';
export * from './catalogue';
export * from './common';
export * from './duty';
export * from './parts';
export * from './people';
export * from './readings';
export { type Operation } from './operation';
export { operations, type OperationName } from './operations';
