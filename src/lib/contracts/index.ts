export * from './common';
export * from './parts';
export * from './people';
