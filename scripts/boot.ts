// Before `astro dev`, which has no boot step of its own: migrate and seed.
import './env';
import { boot } from '@/lib/server/boot';

for (const line of (await boot()).lines) console.log(line);
