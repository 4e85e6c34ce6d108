// @ts-check
import { fileURLToPath } from 'node:url';
import { defineConfig, passthroughImageService } from 'astro/config';
import node from '@astrojs/node';
import react from '@astrojs/react';
import tailwind from '@astrojs/tailwind';
import { out } from './scripts/build/out.mjs';
import { serverSideFiles } from './scripts/build/server-files.mjs';

const at = (/** @type {string} */ path) => fileURLToPath(new URL(path, import.meta.url));

export default defineConfig({
  output: 'server',
  adapter: node({ mode: 'middleware' }),
  outDir: out,
  integrations: [react(), tailwind({ applyBaseStyles: false }), serverSideFiles()],
  server: { host: '127.0.0.1', port: 4321 },
  // Astro's own check refuses every same-origin multipart POST; src/middleware.ts keeps the gate instead.
  security: { checkOrigin: false, allowedDomains: [{}] },
  experimental: {
    csp: {
      directives: [
        "default-src 'self'",
        "img-src 'self' data: blob:",
        "font-src 'self'",
        "connect-src 'self'",
        "worker-src 'self' blob:",
        "object-src 'none'",
        "base-uri 'none'",
        "form-action 'self'",
      ],
      // The one style element that react-aria-components adds to the page.
      styleDirective: { hashes: ['sha256-38RhXrc7EdReTKsOm23ZPOCUgniTUUcjky8QOOrQx6o='] },
    },
  },
  image: { service: passthroughImageService() },
  devToolbar: { enabled: false },
  vite: {
    cacheDir: process.env.VITE_CACHE ?? 'node_modules/.vite',
    build: { target: 'es2022' },
    optimizeDeps: { esbuildOptions: { target: 'es2022' } },
    worker: { format: 'es' },
    resolve: { alias: { '@db': at('./db/index.ts'), '@': at('./src') }, dedupe: ['react', 'react-dom', 'konva'] },
    ssr: { external: ['sequelize', 'sqlite3', 'sharp', '@node-rs/argon2', 'nodemailer', 'multer', 'pino'] },
  },
});
