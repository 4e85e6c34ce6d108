import { build, install } from './lib.mjs';

install();
build();
process.env.NODE_ENV ??= 'production';
await import('./serve.mjs');
