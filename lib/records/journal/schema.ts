import type { Connection } from './connection'
import { JournalUnusable } from './errors'

/** The layout of the journal's file; SQLite keeps each text as written here, so start-up compares it to the letter. */
const VERSION = 1

const HASH = (column: string) => `${column} TEXT NOT NULL CHECK (length(${column}) = 64)`

const TABLES: readonly string[] = [
  // The update stands last: reading the other columns then skips its pages.
  `CREATE TABLE entries (
  v INTEGER NOT NULL, budget TEXT NOT NULL, epoch INTEGER NOT NULL, seq INTEGER NOT NULL, kind TEXT NOT NULL,
  editId TEXT NOT NULL, person TEXT NOT NULL, door TEXT NOT NULL, time INTEGER NOT NULL, clientId INTEGER,
  ${HASH('updateSha256')}, changes TEXT NOT NULL, engine TEXT NOT NULL, ${HASH('prev')}, ${HASH('hash')},
  "update" BLOB NOT NULL
) STRICT`,
  'CREATE UNIQUE INDEX entries_chain ON entries (budget, seq)',
  `CREATE UNIQUE INDEX entries_edit ON entries (budget, editId) WHERE kind IN ('edit', 'seed')`,
  `CREATE INDEX entries_bind ON entries (budget, seq) WHERE kind = 'bind'`,
  'CREATE INDEX entries_first ON entries (budget) WHERE seq = 1',
  `CREATE TABLE snapshots (
  budget TEXT NOT NULL, seq INTEGER NOT NULL, ${HASH('hash')}, ${HASH('sha256')}, state BLOB NOT NULL,
  PRIMARY KEY (budget, seq)
) STRICT`,
  `CREATE TABLE effects (
  budget TEXT NOT NULL, seq INTEGER NOT NULL, effects TEXT NOT NULL,
  PRIMARY KEY (budget, seq)
) STRICT`,
  // A budget that was let go: its rows are gone, this row stays and says where its chain ended.
  `CREATE TABLE deleted (
  budget TEXT NOT NULL PRIMARY KEY, seq INTEGER NOT NULL, ${HASH('hash')}, time INTEGER NOT NULL, person TEXT NOT NULL
) STRICT`,
]

/**
 * What keeps the rows append-only. The checks of rowid and edit id look superfluous beside the unique indexes, but INSERT
 * OR REPLACE would delete the older row without firing its delete trigger. Letting a budget go is one statement: the row
 * in `deleted`, whose trigger takes all rows of that budget in the same transaction.
 */
const TRIGGERS: readonly string[] = [
  `CREATE TRIGGER entries_insert BEFORE INSERT ON entries BEGIN
  SELECT RAISE(ABORT, 'the budget was deleted') WHERE EXISTS (SELECT 1 FROM deleted WHERE budget = NEW.budget);
  SELECT RAISE(ABORT, 'seq does not follow') WHERE NEW.seq IS NOT
    (SELECT coalesce(max(seq), 0) + 1 FROM entries WHERE budget = NEW.budget);
  SELECT RAISE(ABORT, 'prev does not follow') WHERE NEW.prev IS NOT
    coalesce((SELECT hash FROM entries WHERE budget = NEW.budget AND seq = NEW.seq - 1), '${'0'.repeat(64)}');
  SELECT RAISE(ABORT, 'the edit id is in the journal') WHERE NEW.kind IN ('edit', 'seed') AND EXISTS
    (SELECT 1 FROM entries WHERE budget = NEW.budget AND editId = NEW.editId AND kind IN ('edit', 'seed'));
  SELECT RAISE(ABORT, 'the rowid is taken') WHERE EXISTS (SELECT 1 FROM entries WHERE rowid = NEW.rowid);
END`,
  `CREATE TRIGGER entries_update BEFORE UPDATE ON entries BEGIN
  SELECT RAISE(ABORT, 'entries are never changed');
END`,
  `CREATE TRIGGER entries_delete BEFORE DELETE ON entries
  WHEN NOT EXISTS (SELECT 1 FROM deleted WHERE budget = OLD.budget) BEGIN
  SELECT RAISE(ABORT, 'entries are never deleted');
END`,
  `CREATE TRIGGER deleted_insert BEFORE INSERT ON deleted BEGIN
  SELECT RAISE(ABORT, 'the budget was deleted') WHERE EXISTS (SELECT 1 FROM deleted WHERE budget = NEW.budget);
  SELECT RAISE(ABORT, 'not the head of the budget') WHERE NOT EXISTS
    (SELECT 1 FROM entries WHERE budget = NEW.budget AND seq = NEW.seq AND hash = NEW.hash
      AND seq = (SELECT max(seq) FROM entries WHERE budget = NEW.budget));
  SELECT RAISE(ABORT, 'the rowid is taken') WHERE EXISTS (SELECT 1 FROM deleted WHERE rowid = NEW.rowid);
END`,
  `CREATE TRIGGER deleted_lets_go AFTER INSERT ON deleted BEGIN
  DELETE FROM entries WHERE budget = NEW.budget;
  DELETE FROM snapshots WHERE budget = NEW.budget;
  DELETE FROM effects WHERE budget = NEW.budget;
END`,
  `CREATE TRIGGER deleted_update BEFORE UPDATE ON deleted BEGIN
  SELECT RAISE(ABORT, 'rows of deleted stay as they are');
END`,
  `CREATE TRIGGER deleted_delete BEFORE DELETE ON deleted BEGIN
  SELECT RAISE(ABORT, 'rows of deleted stay');
END`,
  // Two are kept, so that a damaged newest one costs a longer replay and no more.
  `CREATE TRIGGER snapshots_keep_two AFTER INSERT ON snapshots BEGIN
  DELETE FROM snapshots WHERE budget = NEW.budget AND seq NOT IN
    (SELECT seq FROM snapshots WHERE budget = NEW.budget ORDER BY seq DESC LIMIT 2);
END`,
]

const OBJECTS = [...TABLES, ...TRIGGERS]

/** Lays out an empty file in one transaction; leaves any other file alone. */
export async function layOut(writer: Connection): Promise<void> {
  const [count] = await writer.all<{ n: number }>('SELECT count(*) AS n FROM sqlite_master')
  if (count?.n !== 0) return
  await writer.exec(['BEGIN IMMEDIATE', ...OBJECTS, `PRAGMA user_version = ${VERSION}`, 'COMMIT'].join(';\n'))
}

/**
 * Reads the layout back and compares it with this version's, so that nobody serves from a journal that can be rewritten.
 * @throws JournalUnusable
 */
export async function requireLayout(reader: Connection): Promise<void> {
  const [version] = await reader.all<{ user_version: number }>('PRAGMA user_version')
  if ((version?.user_version ?? 0) > VERSION)
    throw new JournalUnusable(
      `The journal was written by a newer version (layout ${version?.user_version}, this one knows ${VERSION}); start the newer version.`,
    )
  const found = await reader.all<{ name: string; sql: string }>(
    'SELECT name, sql FROM sqlite_master WHERE sql IS NOT NULL ORDER BY name',
  )
  const wanted = new Set(OBJECTS)
  const changed = found.filter(({ sql }) => !wanted.delete(sql)).map(({ name }) => `${name} is not as it should be`)
  const missing = [...wanted].map((sql) => `${nameOf(sql)} is missing or changed`)
  const faults = [...missing, ...changed]
  if (faults.length > 0)
    throw new JournalUnusable(
      `The journal's tables or triggers were changed (${faults.join('; ')}); put back a backup, or ask who changed them.`,
    )
}

function nameOf(sql: string): string {
  return /^CREATE (?:TABLE|UNIQUE INDEX|INDEX|TRIGGER) (\w+)/.exec(sql)?.[1] ?? sql
}
