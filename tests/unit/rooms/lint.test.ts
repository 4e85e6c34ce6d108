import { ESLint } from 'eslint';
import { beforeAll, describe, expect, test } from 'vitest';

type Row = readonly [sentence: string, file: string, code: string];

const IMPORT_RULES = new Set(['no-restricted-imports', 'no-restricted-syntax']);
const eslint = new ESLint();
beforeAll(() => eslint.calculateConfigForFile('src/middleware.ts'), 60_000); // loads the plugins

/** What lint says of the imports of a file that need not exist. */
async function saidOf(file: string, code: string): Promise<string> {
  const text = file.endsWith('.astro') && !code.startsWith('---') ? `---\n${code}\n---\n<p>Words</p>\n` : `${code}\n`;
  const [result] = await eslint.lintText(text, { filePath: file });
  const messages = result!.messages;
  expect(
    messages.filter((message) => message.fatal || message.ruleId === null),
    'the row is code that lint can read',
  ).toEqual([]);
  return messages
    .filter((message) => IMPORT_RULES.has(message.ruleId!))
    .map((message) => message.message)
    .join('\n');
}

const UNITS = 'src/lib/units/parse.ts';
const WORDS = 'src/components/when.ts';
const DEEP = 'src/components/islands/bench/Bench.tsx';
const CHIP = 'src/components/Chip.astro';
const CONTRACT = 'src/lib/contracts/parts.ts';
const USE_CASE = 'src/lib/server/sheets/sheets.ts';
const QUERY = 'db/queries/people.ts';
const script = (code: string) => `---\nconst a = 1;\n---\n<p>{a}</p>\n<script>\n${code}\n</script>\n`;

const ALLOWED: readonly Row[] = [
  ['a pure room imports its own files', UNITS, "import { a } from './format';"],
  ['a pure room imports the door of a room before it', 'src/lib/duty/search.ts', "import { type A, b } from '@/lib/module';"],
  ['numeric uses a library of matrices', 'src/lib/numeric/solve.ts', "import { Matrix } from 'ml-matrix';"],
  ['reading validates with zod', 'src/lib/reading/parse.ts', "import { z } from 'zod';"],
  ['editor validates with zod', 'src/lib/editor/schema.ts', "import { z } from 'zod';"],
  ['contracts import zod', CONTRACT, "import { z } from 'zod';"],
  ['contracts import the doors of pure rooms', CONTRACT, "export type { Reading } from '@/lib/reading';"],
  ['a component imports React', DEEP, "import { useState } from 'react';"],
  ['a component imports contracts', DEEP, "import { type A, operations } from '@/lib/contracts';"],
  ['a component loads a neighbour when it is needed', DEEP, "export const a = () => import('../state/files');"],
  ['a component keeps unsaved work with a browser library', DEEP, "import { openDB } from 'idb';"],
  ['a server-drawn component imports a pure room', CHIP, "import { a } from '@/lib/units';\na();"],
  ['a layout asks a use case', 'src/layouts/App.astro', "import { a } from '@/lib/server/review';\na();"],
  ['a page asks a use case', 'src/pages/sheets/new.astro', "import { a } from '@/lib/server/sheets';\na();"],
  ['an endpoint asks a use case', 'src/pages/api/trail.ts', "import { a } from '@/lib/server/trail';"],
  ['a script of a page imports a component', 'src/pages/duty.astro', script("import { a } from '@/components/when';\na();")],
  ['a use case enters the database by its door', USE_CASE, "import { a } from '@db';"],
  ['a use case imports its neighbours', USE_CASE, "import { a } from '../refusal';"],
  ['a use case imports Node built-ins', USE_CASE, "import { readFileSync } from 'node:fs';"],
  ['the database talks to Sequelize', QUERY, "import { Op } from 'sequelize';"],
  ['the database imports contracts', QUERY, "import type { A } from '@/lib/contracts';"],
  ["a room's own test looks inside the room", 'tests/unit/fit/residuals.test.ts', "import { a } from '@/lib/fit/residuals';"],
  ["the database's own test looks inside it", 'tests/db/queue.test.ts', "import { a } from '../../db/database';"],
];

const PURE = 'may import only its own files';
const DOOR = 'Enter a room by its door';
const DB_DOOR = 'The database has one door';
const BY_USE_CASE = 'Only src/lib/server reaches the database';
const DRIVERS = 'Only db/ talks to Sequelize';
const SERVER = 'The server is above';
const TOP = 'Pages, layouts and middleware are on top';
const BUILTINS = 'which has no Node built-ins';
const NO_SCREENS = 'know no screens';

const REFUSED: readonly (readonly [...Row, reason: string])[] = [
  ['a pure room climbs into a later room', UNITS, "import { a } from '../module/constant';", PURE],
  ["a pure room climbs to another room's door", UNITS, "import { a } from '../numeric';", PURE],
  ['a pure room climbs by a detour', UNITS, "import { a } from './x/../../numeric';", PURE],
  ['a pure room climbs to a component', UNITS, "import { a } from '../../components/when';", PURE],
  ['a pure room climbs to the database', UNITS, "import { a } from '../../../db/index';", PURE],
  ['a pure room names the database', UNITS, "import { a } from '@db';", PURE],
  ['a pure room imports a later room', UNITS, "import { a } from '@/lib/fit';", PURE],
  ['a pure room imports only a type of a later room', UNITS, "import type { A } from '@/lib/fit';", PURE],
  ['a pure room passes on a later room', UNITS, "export { a } from '@/lib/fit';", PURE],
  ['a pure room passes on all of a later room', UNITS, "export * from '@/lib/fit';", PURE],
  ['a pure room enters an earlier room beside its door', 'src/lib/duty/search.ts', "import { a } from '@/lib/units/parse';", PURE],
  ['a pure room imports itself by the alias', UNITS, "import { a } from '@/lib/units';", PURE],
  ['a pure room loads a later room when it is needed', UNITS, "export const a = () => import('@/lib/fit');", 'at the top of the file only'],
  ['a pure room names the type of a later room in place', UNITS, "export type A = import('@/lib/fit').A;", 'at the top of the file only'],
  ['a pure room gathers files of the build', UNITS, "export const a = import.meta.glob('../fit/*');", 'where it runs'],
  ['a pure room imports a bare built-in', UNITS, "import os from 'os';", PURE],
  ['a pure room imports another bare built-in', UNITS, "import http from 'http';", PURE],
  ['a pure room imports a built-in by its prefix', UNITS, "import { readFileSync } from 'node:fs';", PURE],
  ["a pure room opens the browser's database", UNITS, "import { openDB } from 'idb';", PURE],
  ['a pure room imports React', UNITS, "import { useState } from 'react';", PURE],
  ['units validates with zod', UNITS, "import { z } from 'zod';", PURE],
  ['duty validates with zod', 'src/lib/duty/form.ts', "import type { z } from 'zod';", PURE],
  ['a pure room imports contracts', 'src/lib/access/access.ts', "import type { A } from '@/lib/contracts';", PURE],
  ['a script file of a pure room climbs', 'src/lib/units/parse.mjs', "import { a } from '../numeric';", PURE],
  ['contracts import React', CONTRACT, "import { useState } from 'react';", PURE],
  ['contracts import a built-in', CONTRACT, "import { readFileSync } from 'node:fs';", PURE],
  ['contracts import Sequelize', CONTRACT, "import { Op } from 'sequelize';", PURE],
  ['contracts import a type of the server', CONTRACT, "import type { A } from '@/lib/server/people';", PURE],
  ['contracts climb to the server', CONTRACT, "import type { A } from '../server/people';", PURE],
  ['a component imports Sequelize', DEEP, "import { Op } from 'sequelize';", DRIVERS],
  ['a component imports a built-in by its prefix', DEEP, "import { readFileSync } from 'node:fs';", BUILTINS],
  ['a component imports a bare built-in', WORDS, "import path from 'path/posix';", BUILTINS],
  ['a component imports a page', DEEP, "import { a } from '@/pages/x';", TOP],
  ['a component climbs to the server', WORDS, "import { a } from '../lib/server/mail';", SERVER],
  ['a component imports the server', DEEP, "import { a } from '@/lib/server/mail';", SERVER],
  ["a component imports the server's door", DEEP, "import { a } from '@/lib/server';", SERVER],
  ['a component names the server from the root', DEEP, "import { a } from '/src/lib/server/mail';", SERVER],
  ['a component imports only a type of the server', DEEP, "import type { A } from '@/lib/server/mail';", SERVER],
  ['a component names a type of the server in place', DEEP, "export type A = import('@/lib/server/mail').A;", SERVER],
  ['a component loads the server when it is needed', DEEP, "export const a = () => import('@/lib/server/mail');", SERVER],
  ['a component hides what it loads', DEEP, 'export const a = (file: string) => import(file);', 'as a plain string'],
  ['a component passes on the server', DEEP, "export * from '@/lib/server/mail';", SERVER],
  ['a component climbs to a query', WORDS, "import { a } from '../../db/queries/people';", BY_USE_CASE],
  ['a component imports the database', DEEP, "import { a } from '@db';", BY_USE_CASE],
  ['a component imports a part of a pure room', DEEP, "import { a } from '../../../lib/units/parse';", DOOR],
  ['a component hashes passwords', DEEP, "import { hash } from '@node-rs/argon2';", 'on the server only'],
  ['a server-drawn component imports the server', CHIP, "import { a } from '@/lib/server/mail';\na();", SERVER],
  ['a server-drawn component imports the database', CHIP, "import { a } from '@db';\na();", BY_USE_CASE],
  ['a server-drawn component imports a built-in', CHIP, "import os from 'os';\nos.cpus();", BUILTINS],
  ['a script of a component imports the server', CHIP, script("import { a } from '@/lib/server/mail';\na();"), SERVER],
  ['a script of a page imports the server', 'src/pages/duty.astro', script("import { a } from '@/lib/server/mail';\na();"), SERVER],
  ['a layout imports a page', 'src/layouts/App.astro', "import { a } from '@/pages/x';\na();", 'A layout is below the pages'],
  ['a layout imports the database', 'src/layouts/App.astro', "import { a } from '@db';\na();", BY_USE_CASE],
  ['a page imports the database', 'src/pages/duty.astro', "import { a } from '@db';\na();", BY_USE_CASE],
  ['an endpoint imports the database', 'src/pages/api/trail.ts', "import { a } from '@db';", BY_USE_CASE],
  ['an endpoint climbs to the database', 'src/pages/api/trail.ts', "import { a } from '../../../db';", BY_USE_CASE],
  ['the middleware imports the database', 'src/middleware.ts', "import { a } from '@db';", BY_USE_CASE],
  ['the middleware imports Sequelize', 'src/middleware.ts', "import { Op } from 'sequelize';", DRIVERS],
  ['a page imports a part of a pure room', 'src/pages/duty.astro', "import { a } from '@/lib/units/parse';\na();", DOOR],
  ['a page imports a test', 'src/pages/duty.astro', "import { a } from '../../tests/support/api';\na();", 'no scripts, tests or samples'],
  ['a use case climbs to a page', USE_CASE, "import { a } from '../../pages/x';", TOP],
  ['a use case at the top climbs to a page', 'src/lib/server/config.ts', "import { a } from '../../pages/x';", TOP],
  ['a use case imports a component', USE_CASE, "import type { A } from '@/components/when';", NO_SCREENS],
  ['a use case imports Sequelize', USE_CASE, "import { Op } from 'sequelize';", DRIVERS],
  ['a use case enters the database beside its door', USE_CASE, "import { a } from '@db/queries/people';", DB_DOOR],
  ['a use case climbs to a query', USE_CASE, "import { a } from '../../../../db/queries/people';", DB_DOOR],
  ['a use case climbs to a part of a pure room', USE_CASE, "import { a } from '../../units/parse';", 'stays in src/lib/server'],
  [
    'a file of the server climbs to a part of a pure room',
    'src/lib/server/hash.ts',
    "import { a } from '../units/parse';",
    'stays in src/lib/server',
  ],
  ['the database climbs to the server', QUERY, "import { a } from '../src/lib/server/mail';", SERVER],
  ['the database imports the server', QUERY, "import type { A } from '@/lib/server/mail';", SERVER],
  ['the database imports a component', QUERY, "import { a } from '../../src/components/when';", NO_SCREENS],
  ["another room's test looks inside a room", 'tests/unit/duty/search.test.ts', "import { a } from '../../db/queries/people';", DB_DOOR],
  ['a test of the API looks inside a room', 'tests/api/duty.test.ts', "import { a } from '@/lib/duty/search';", DOOR],
  ['a test of the API looks inside the database', 'tests/api/duty.test.ts', "import { a } from '../../db/database';", DB_DOOR],
];

describe('lint lets pass', () => {
  test.each(ALLOWED)('%s', async (_, file, code) => expect(await saidOf(file, code)).toBe(''));
});

describe('lint refuses with its reason when', () => {
  test.each(REFUSED)('%s', async (_, file, code, reason) => expect(await saidOf(file, code)).toContain(reason));
});
