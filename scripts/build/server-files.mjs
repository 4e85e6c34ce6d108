import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { build } from 'esbuild';

/**
 * What the server runs beside Astro's own bundle: the boot step (migrate, seed, self-check).
 * Astro loads its middleware on the first request; boot has to be done before the port opens.
 */
export const serverSideFiles = () => ({
  name: 'couplet-server-files',
  hooks: {
    'astro:build:done': async (/** @type {{ dir: URL }} */ { dir }) => {
      const root = fileURLToPath(new URL('../..', import.meta.url));
      await build({
        absWorkingDir: root,
        entryPoints: { boot: 'src/lib/server/boot.ts' },
        outdir: path.join(fileURLToPath(dir), '../server/node'),
        bundle: true,
        platform: 'node',
        format: 'esm',
        target: 'node20',
        packages: 'external',
        outExtension: { '.js': '.mjs' },
        logLevel: 'warning',
      });
    },
  },
});
