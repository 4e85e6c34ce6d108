/**
 * The rooms of the project and who may import whom, as ESLint rules.
 * pages → src/lib/server → db → contracts → pure rooms; a pure room imports only the rooms before it.
 */
export const PURE_ROOMS = [
  'units',
  'numeric',
  'geometry',
  'trace',
  'module',
  'fit',
  'reading',
  'duty',
  'pulldown',
  'exports',
  'editor',
  'access',
];

const NOT_PURE = [
  'react',
  'react/*',
  'react-dom',
  'react-dom/*',
  'react-konva',
  'konva',
  'astro',
  'astro/*',
  'astro:*',
  'sequelize',
  'sqlite3',
  'sharp',
  'node:*',
  'fs',
  'path',
  'crypto',
];
const SERVER_ONLY = ['sequelize', 'sqlite3', 'umzug'];

const forbid = (group, message) => ({ group, message });
const restrict = (files, patterns, ignores = []) => ({
  files,
  ignores,
  rules: { 'no-restricted-imports': ['error', { patterns }] },
});

const DOORS = forbid(
  PURE_ROOMS.map((room) => `@/lib/${room}/*`),
  'Enter a room by its door: @/lib/<room>.',
);
const DB_DOOR = forbid(
  ['@db/*', '**/db/connection*', '**/db/models/*', '**/db/queries/*', '**/db/migrations/*'],
  'The database has one door: @db.',
);
const DRIVERS = forbid(SERVER_ONLY, 'Only db/ talks to Sequelize.');
const SERVER = forbid(['@/lib/server', '@/lib/server/*', '@db'], 'A browser or pure file must not reach the server or the database.');
const PURITY = forbid(
  NOT_PURE,
  'Pure rooms run in a browser worker, on the server and in the command: no React, Konva, Astro, Sequelize, Node or DOM.',
);
const OUTWARD = forbid(
  ['@/lib/contracts', '@/lib/contracts/*', '@/components/*', '@/layouts/*', '@/pages/*', '@/middleware'],
  'Imports go pages → server → db → contracts → pure rooms, never the other way.',
);

const DOM_GLOBALS = ['window', 'document', 'navigator', 'localStorage', 'fetch', 'process', 'Buffer', 'require'];

const pureRules = PURE_ROOMS.flatMap((room, at) => [
  restrict(
    [`src/lib/${room}/**/*.ts`],
    [
      PURITY,
      SERVER,
      OUTWARD,
      DOORS,
      forbid(
        PURE_ROOMS.slice(at).flatMap((later) => [`@/lib/${later}`, `@/lib/${later}/*`]),
        `${room} may import only the rooms before it: ${PURE_ROOMS.slice(0, at).join(', ') || 'none'}; inside a room use relative paths.`,
      ),
    ],
  ),
  {
    files: [`src/lib/${room}/**/*.ts`],
    rules: { 'no-restricted-globals': ['error', ...DOM_GLOBALS.map((name) => ({ name, message: 'Pure rooms know no Node and no DOM.' }))] },
  },
]);

export const roomRules = [
  restrict(
    ['src/**/*.{ts,tsx,astro}', 'scripts/**/*.ts', 'tests/**/*.{ts,tsx}'],
    [DOORS, DB_DOOR, DRIVERS],
    ['tests/db/**', ...PURE_ROOMS.map((room) => `tests/unit/${room}/**`)],
  ),
  restrict(['src/components/**/*.{ts,tsx}'], [SERVER, DOORS]),
  restrict(
    ['src/lib/contracts/**/*.ts'],
    [SERVER, DOORS, forbid(['@/components/*', '@/pages/*'], 'Contracts are imported by both sides and import only pure rooms.')],
  ),
  restrict(
    ['db/**/*.ts'],
    [
      DOORS,
      forbid(
        ['@/lib/server', '@/lib/server/*', '@/components/*', '@/pages/*'],
        'db is below the server: it imports contracts and pure rooms only.',
      ),
    ],
  ),
  restrict(
    ['src/lib/server/**/*.ts'],
    [DOORS, DB_DOOR, DRIVERS, forbid(['@/components/*', '@/pages/*', '@/layouts/*'], 'The server knows no screens.')],
  ),
  ...pureRules,
];
