import fc from 'fast-check';

/** Properties run on the same cases each time; `SEED=n npm test -- unit` tries others. A failing seed is printed with its case. */
const DEFAULT_SEED = 20261201;

fc.configureGlobal({ seed: Number(process.env.SEED ?? DEFAULT_SEED) });
