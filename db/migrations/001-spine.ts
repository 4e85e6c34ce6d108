import type { SerialSequelize } from '../connection';
import type { Migration } from '.';

// Hand-written SQL: STRICT tables and CHECKs keep what the models promise even against a wrong query.
// Instants are UTC text as Sequelize writes them; "not stated" is NULL everywhere.
const TABLES = [
  `CREATE TABLE roles (name TEXT PRIMARY KEY) STRICT`,

  `CREATE TABLE users (
    id TEXT PRIMARY KEY,
    email TEXT NOT NULL UNIQUE COLLATE NOCASE,
    name TEXT NOT NULL CHECK (length(name) > 0),
    password_hash TEXT NOT NULL,
    disabled_at TEXT,
    created_at TEXT NOT NULL,
    updated_at TEXT NOT NULL
  ) STRICT`,

  `CREATE TABLE user_roles (
    user_id TEXT NOT NULL REFERENCES users (id) ON DELETE CASCADE,
    role TEXT NOT NULL REFERENCES roles (name),
    PRIMARY KEY (user_id, role)
  ) STRICT`,

  // id is SHA-256 of the cookie's value: the table alone signs nobody in.
  `CREATE TABLE sessions (
    id TEXT PRIMARY KEY,
    user_id TEXT NOT NULL REFERENCES users (id) ON DELETE CASCADE,
    expires_at TEXT NOT NULL,
    created_at TEXT NOT NULL,
    agent TEXT NOT NULL DEFAULT ''
  ) STRICT`,
  `CREATE INDEX sessions_of_user ON sessions (user_id)`,

  `CREATE TABLE vendors (
    id INTEGER PRIMARY KEY,
    name TEXT NOT NULL UNIQUE COLLATE NOCASE CHECK (length(name) > 0),
    created_at TEXT NOT NULL,
    updated_at TEXT NOT NULL
  ) STRICT`,

  `CREATE TABLE modules (
    id INTEGER PRIMARY KEY,
    vendor_id INTEGER NOT NULL REFERENCES vendors (id),
    part_number TEXT NOT NULL COLLATE NOCASE CHECK (length(part_number) > 0),
    variant TEXT NOT NULL DEFAULT '' COLLATE NOCASE,
    stages INTEGER CHECK (stages >= 1),
    couples INTEGER CHECK (couples >= 1),
    cold_plate_width_mm REAL CHECK (cold_plate_width_mm > 0),
    cold_plate_depth_mm REAL CHECK (cold_plate_depth_mm > 0),
    hot_plate_width_mm REAL CHECK (hot_plate_width_mm > 0),
    hot_plate_depth_mm REAL CHECK (hot_plate_depth_mm > 0),
    height_mm REAL CHECK (height_mm > 0),
    max_temperature_c REAL,
    leads_ohm REAL CHECK (leads_ohm >= 0),
    sealing TEXT,
    ac_resistance_ohm REAL CHECK (ac_resistance_ohm > 0),
    ac_resistance_at_c REAL,
    version INTEGER NOT NULL DEFAULT 1,
    created_at TEXT NOT NULL,
    updated_at TEXT NOT NULL,
    UNIQUE (vendor_id, part_number, variant)
  ) STRICT`,

  `CREATE TABLE ratings (
    id INTEGER PRIMARY KEY,
    module_id INTEGER NOT NULL REFERENCES modules (id) ON DELETE CASCADE,
    hot_side_c REAL NOT NULL,
    imax_a REAL CHECK (imax_a > 0),
    vmax_v REAL CHECK (vmax_v > 0),
    qmax_w REAL CHECK (qmax_w > 0),
    dtmax_k REAL CHECK (dtmax_k > 0),
    imax_means TEXT NOT NULL DEFAULT 'notStated' CHECK (imax_means IN ('largestDeltaT', 'mostHeat', 'allowed', 'notStated')),
    basis TEXT NOT NULL DEFAULT 'notStated' CHECK (basis IN ('typical', 'minimum', 'calculated', 'measured', 'notStated')),
    atmosphere TEXT NOT NULL DEFAULT 'notStated' CHECK (atmosphere IN ('vacuum', 'dryNitrogen', 'air', 'notStated')),
    tolerance_percent REAL CHECK (tolerance_percent >= 0)
  ) STRICT`,
  `CREATE INDEX ratings_of_module ON ratings (module_id)`,

  `CREATE TABLE sheets (
    id INTEGER PRIMARY KEY,
    vendor_id INTEGER NOT NULL REFERENCES vendors (id),
    title TEXT NOT NULL DEFAULT '',
    number TEXT NOT NULL DEFAULT '',
    revision TEXT NOT NULL DEFAULT '',
    dated TEXT NOT NULL DEFAULT '',
    obtained_from TEXT NOT NULL DEFAULT '',
    obtained_on TEXT NOT NULL DEFAULT '',
    created_by TEXT NOT NULL REFERENCES users (id),
    version INTEGER NOT NULL DEFAULT 1,
    created_at TEXT NOT NULL,
    updated_at TEXT NOT NULL
  ) STRICT`,
  `CREATE INDEX sheets_of_vendor ON sheets (vendor_id)`,

  // One row for each distinct uploaded file; the files lie under uploads/ by their hashes.
  `CREATE TABLE pictures (
    id INTEGER PRIMARY KEY,
    file_sha256 TEXT NOT NULL UNIQUE CHECK (length(file_sha256) = 64),
    png_sha256 TEXT NOT NULL CHECK (length(png_sha256) = 64),
    pixels_sha256 TEXT NOT NULL CHECK (length(pixels_sha256) = 64),
    original_name TEXT NOT NULL,
    media_type TEXT NOT NULL,
    bytes INTEGER NOT NULL,
    width INTEGER NOT NULL CHECK (width > 0),
    height INTEGER NOT NULL CHECK (height > 0),
    notes TEXT NOT NULL DEFAULT '[]' CHECK (json_valid(notes)),
    created_by TEXT NOT NULL REFERENCES users (id),
    created_at TEXT NOT NULL
  ) STRICT`,
  `CREATE INDEX pictures_by_pixels ON pictures (pixels_sha256)`,

  `CREATE TABLE pages (
    id INTEGER PRIMARY KEY,
    sheet_id INTEGER NOT NULL REFERENCES sheets (id) ON DELETE CASCADE,
    picture_id INTEGER NOT NULL REFERENCES pictures (id),
    position INTEGER NOT NULL,
    label TEXT NOT NULL DEFAULT '',
    created_at TEXT NOT NULL,
    UNIQUE (sheet_id, picture_id)
  ) STRICT`,
  `CREATE INDEX pages_of_picture ON pages (picture_id)`,

  `CREATE TABLE readings (
    id INTEGER PRIMARY KEY,
    module_id INTEGER NOT NULL REFERENCES modules (id),
    sheet_id INTEGER NOT NULL REFERENCES sheets (id),
    owner_id TEXT NOT NULL REFERENCES users (id),
    state TEXT NOT NULL CHECK (state IN ('draft', 'handed-in', 'returned', 'approved', 'superseded', 'withdrawn')),
    version INTEGER NOT NULL DEFAULT 1,
    document TEXT NOT NULL CHECK (json_valid(document)),
    saved_by TEXT NOT NULL REFERENCES users (id),
    saved_at TEXT NOT NULL,
    created_at TEXT NOT NULL
  ) STRICT`,
  `CREATE INDEX readings_of_owner ON readings (owner_id)`,
  `CREATE INDEX readings_by_state ON readings (state)`,
  // At most one approved reading a module, whatever the code does.
  `CREATE UNIQUE INDEX one_approved_reading ON readings (module_id) WHERE state = 'approved'`,

  `CREATE TABLE reading_editors (
    reading_id INTEGER NOT NULL REFERENCES readings (id) ON DELETE CASCADE,
    user_id TEXT NOT NULL REFERENCES users (id),
    PRIMARY KEY (reading_id, user_id)
  ) STRICT`,

  // Which pictures a reading stands on, kept in step with its document.
  `CREATE TABLE reading_pictures (
    reading_id INTEGER NOT NULL REFERENCES readings (id) ON DELETE CASCADE,
    picture_id INTEGER NOT NULL REFERENCES pictures (id),
    PRIMARY KEY (reading_id, picture_id)
  ) STRICT`,
  `CREATE INDEX readings_of_picture ON reading_pictures (picture_id)`,

  // What was handed in and, once approved, is frozen: one row a hand-in, the newest counts.
  `CREATE TABLE models (
    id INTEGER PRIMARY KEY,
    reading_id INTEGER NOT NULL REFERENCES readings (id) ON DELETE CASCADE,
    module_id INTEGER NOT NULL REFERENCES modules (id),
    document TEXT NOT NULL CHECK (json_valid(document)),
    result TEXT NOT NULL CHECK (json_valid(result)),
    engine TEXT NOT NULL,
    hash TEXT NOT NULL CHECK (length(hash) = 64),
    created_at TEXT NOT NULL
  ) STRICT`,
  `CREATE INDEX models_of_reading ON models (reading_id)`,
  `CREATE INDEX models_of_module ON models (module_id)`,

  `CREATE TABLE decisions (
    id INTEGER PRIMARY KEY,
    reading_id INTEGER NOT NULL REFERENCES readings (id) ON DELETE CASCADE,
    what TEXT NOT NULL CHECK (what IN ('handed-in', 'taken-back', 'returned', 'approved', 'superseded', 'withdrawn', 'restored')),
    reason TEXT NOT NULL DEFAULT '',
    user_id TEXT NOT NULL REFERENCES users (id),
    model_id INTEGER REFERENCES models (id),
    created_at TEXT NOT NULL
  ) STRICT`,
  `CREATE INDEX decisions_of_reading ON decisions (reading_id)`,

  `CREATE TABLE trail (
    id INTEGER PRIMARY KEY,
    user_id TEXT REFERENCES users (id),
    action TEXT NOT NULL,
    object TEXT NOT NULL DEFAULT '',
    detail TEXT NOT NULL DEFAULT '{}' CHECK (json_valid(detail)),
    created_at TEXT NOT NULL
  ) STRICT`,
  `CREATE INDEX trail_by_time ON trail (created_at)`,

  `CREATE TABLE mail_queue (
    id INTEGER PRIMARY KEY,
    recipient TEXT NOT NULL,
    subject TEXT NOT NULL,
    body TEXT NOT NULL,
    state TEXT NOT NULL DEFAULT 'queued' CHECK (state IN ('queued', 'sending', 'sent', 'failed')),
    tries INTEGER NOT NULL DEFAULT 0,
    next_try_at TEXT NOT NULL,
    last_error TEXT NOT NULL DEFAULT '',
    created_at TEXT NOT NULL,
    sent_at TEXT
  ) STRICT`,
  `CREATE INDEX mail_waiting ON mail_queue (state, next_try_at)`,

  // Raised in the transaction of every change that the search must see.
  `CREATE TABLE counters (name TEXT PRIMARY KEY, value INTEGER NOT NULL) STRICT`,
  `INSERT INTO counters VALUES ('catalogue', 1)`,
  `INSERT INTO roles VALUES ('engineer'), ('librarian'), ('designer'), ('administrator')`,
];

const NAMES = TABLES.flatMap((sql) => /CREATE TABLE (\w+)/.exec(sql)?.[1] ?? []);

/** All of it or nothing, even when the power goes in the middle. */
const run = (connection: SerialSequelize, statements: readonly string[]) =>
  connection.inTransaction(async () => {
    for (const sql of statements) await connection.query(sql);
  });

export const spine: Migration = {
  name: '001-spine',
  async up({ context }) {
    await run(context.sequelize as SerialSequelize, TABLES);
  },
  async down({ context }) {
    await run(
      context.sequelize as SerialSequelize,
      [...NAMES].reverse().map((name) => `DROP TABLE ${name}`),
    );
  },
};
