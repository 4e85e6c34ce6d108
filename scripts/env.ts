// Imported before anything that reads the settings.
import { existsSync } from 'node:fs';

if (existsSync('.env')) process.loadEnvFile('.env');
