import { builtinModules } from 'node:module';

/**
 * The rooms of the project and who may import whom, as ESLint rules.
 * pages → src/lib/server → db → contracts → pure rooms; a pure room imports only the rooms before it.
 * `tests/unit/rooms/lint.test.ts` holds a sentence for every way in.
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

// Packages a pure room may use; every other one is refused.
const MATHS = ['ml-matrix', 'simple-statistics'];
const VALIDATION = { reading: ['zod'], editor: ['zod'], contracts: ['zod'] };
const DRIVER_PACKAGES = ['sequelize', 'sqlite3', 'umzug'];
const SERVER_PACKAGES = ['@node-rs/argon2', 'lucia', 'multer', 'nodemailer', 'pino', 'rate-limiter-flexible', 'sharp'];

const either = (names) => `(?:${names.join('|')})`;

/** Every way to write a path under src: by alias, from the project's root, or by climbing out with `../`. */
const under = (...places) => String.raw`^(?:@/|/?src/|.*\.\./(?:src/)?)${either(places)}(?:/|$)`;
/** The same for a folder beside src. */
const beside = (...folders) => String.raw`^(?:/?|.*\.\./)${either(folders)}(?:/|$)`;
const packages = (...names) => `^${either(names)}(?:/|$)`;

const refuse = (regex, message) => ({ regex, message });

const DOORS = refuse(under(`lib/${either(PURE_ROOMS)}/.*`), 'Enter a room by its door: @/lib/<room>.');
const DB_PARTS = refuse(`^@db/|${beside('db')}`, 'The database has one door: @db.');
const DRIVERS = refuse(packages(...DRIVER_PACKAGES), 'Only db/ talks to Sequelize.');
const TOOLS = refuse(beside('scripts', 'tests', 'samples'), 'What is served imports no scripts, tests or samples.');
const DATABASE = refuse(`^@db(?:/|$)|${beside('db')}`, 'Only src/lib/server reaches the database: call a use case.');
const SERVER = refuse(under('lib/server'), 'The server is above: components, contracts, db and pure rooms do not reach it.');
const PAGES = refuse(under('pages', 'layouts', 'middleware'), 'Pages, layouts and middleware are on top: nothing below imports them.');
const COMPONENTS = refuse(under('components'), 'The server and the database know no screens.');
const BUILTINS = refuse(`^node:|${packages(...builtinModules)}`, 'Components run in a browser too, which has no Node built-ins.');
const SERVER_ONLY = refuse(packages(...SERVER_PACKAGES), 'This package runs on the server only.');
const climbing = (steps) =>
  refuse(String.raw`^(?:\./)*(?:\.\./){${steps}}`, 'A relative import stays in src/lib/server: write @/ and the path.');

/** What import() and a type's import('…') name, which no-restricted-imports does not see. */
const LAZY = ':matches(ImportExpression, TSImportType, TSImportType > TSLiteralType) > Literal';
const COMPUTED = {
  selector: 'ImportExpression[source.type!="Literal"]',
  message: 'Write the path of import() as a plain string, for lint to judge.',
};

const lazily = ({ regex, message }) => ({ selector: `${LAZY}[value=/${regex.replaceAll('/', String.raw`\x2F`)}/iu]`, message });

const code = (...folders) => folders.map((folder) => `${folder}.{ts,tsx,mts,cts,js,jsx,mjs,cjs,astro}`);

/** A file follows the last block of rules that names it, so each block states everything. */
const block = (files, refusals, { syntax = refusals.map(lazily), globals = [] } = {}) => ({
  files,
  rules: {
    'no-restricted-imports': ['error', { patterns: refusals }],
    'no-restricted-syntax': ['error', ...syntax],
    'no-restricted-globals': ['error', ...globals],
  },
});
const served = (files, refusals) => block(files, refusals, { syntax: [COMPUTED, ...refusals.map(lazily)] });

const DOM_GLOBALS = ['window', 'document', 'navigator', 'localStorage', 'fetch', 'process', 'Buffer', 'require'];
const PURE = {
  syntax: [
    { selector: 'ImportExpression, TSImportType', message: 'A pure room imports at the top of the file only.' },
    { selector: 'MetaProperty', message: 'A pure room does not know where it runs.' },
  ],
  globals: DOM_GLOBALS.map((name) => ({ name, message: 'Pure rooms know no Node and no DOM.' })),
};

/** A pure room refuses all but its own files, the doors of the rooms before it, and a few packages. */
function pureRoom(room, at, rooms) {
  const before = rooms.slice(0, at);
  const libraries = [...MATHS, ...(VALIDATION[room] ?? [])];
  const own = String.raw`\.(?:/(?!.*\.\.(?:/|$)).*)?$`;
  const allowed = [own, `@/lib/${either(before)}$`, `${either(libraries)}$`];
  const message =
    `${room} runs in a browser worker, on the server and in the command, so it may import only its own files (./…), ` +
    `the doors of the rooms before it (${before.join(', ') || 'none'}) and ${libraries.join(', ')}.`;
  return block(code(`src/lib/${room}/**/*`), [refuse(`^(?!${either(allowed)})`, message)], PURE);
}

const SERVED = [DOORS, DRIVERS, TOOLS];
const BROWSER = [...SERVED, DATABASE, SERVER, PAGES, BUILTINS, SERVER_ONLY];

export const roomRules = [
  // Pages, layouts, middleware: drawn on the server, through use cases.
  served(code('src/**/*'), [...SERVED, DATABASE]),
  served(code('src/layouts/**/*'), [...SERVED, DATABASE, refuse(under('pages', 'middleware'), 'A layout is below the pages.')]),
  served(code('src/components/**/*'), BROWSER),
  served(code('src/**/*.astro/*'), BROWSER), // the <script> elements of pages and layouts
  served(code('src/lib/server/*/**/*'), [...SERVED, DB_PARTS, COMPONENTS, PAGES, climbing(2)]),
  served(code('src/lib/server/*'), [...SERVED, DB_PARTS, COMPONENTS, PAGES, climbing(1)]),
  served(code('db/**/*'), [DOORS, TOOLS, SERVER, COMPONENTS, PAGES]),
  ...[...PURE_ROOMS, 'contracts'].map(pureRoom),
  block(['scripts/**/*.ts', 'tests/**/*.{ts,tsx}'], [DOORS, DB_PARTS, DRIVERS]),
  // A room's own tests may look inside it.
  block(['tests/db/**/*.ts'], [DOORS]),
  block(
    PURE_ROOMS.map((room) => `tests/unit/${room}/**/*.ts`),
    [DB_PARTS, DRIVERS],
  ),
];
