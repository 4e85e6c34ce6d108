// `npm run verify`: recomputes every hash that an approval rests on. Exit status 1 when anything is not as it was kept.
import './env';
import { existsSync } from 'node:fs';
import { config } from '@/lib/server/config';

const many = (n: number, one: string) => `${n} ${one}${n === 1 ? '' : 's'}`;

async function run(): Promise<number> {
  const { databaseFile } = config();
  if (!existsSync(databaseFile))
    throw new Error(`There is no database at ${databaseFile}. Start Couplet once, or set COUPLET_DATA to the folder that holds it.`);
  const [{ closeDatabase, openDatabase }, { verify }] = await Promise.all([import('@db'), import('@/lib/server/verify')]);
  await openDatabase(databaseFile);
  try {
    const { models, files, faults } = await verify();
    for (const fault of faults) console.log(fault);
    console.log([many(models, 'model'), many(files, 'file'), many(faults.length, 'fault')].join(', '));
    return faults.length === 0 ? 0 : 1;
  } finally {
    await closeDatabase();
  }
}

process.exitCode = await run().catch((error: unknown) => {
  console.error(error instanceof Error ? error.message : error);
  return 1;
});
