// Before `astro dev`, which has no boot step of its own: migrate and seed.
import { existsSync } from 'node:fs';
import { boot } from '@/lib/server/boot';

if (existsSync('.env')) process.loadEnvFile('.env');
for (const line of (await boot()).lines) console.log(line);
