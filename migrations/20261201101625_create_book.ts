import type { Knex } from 'knex';

const ID = 'CHAR(36) CHARACTER SET ascii COLLATE ascii_bin';
const HASH = 'CHAR(64) CHARACTER SET ascii COLLATE ascii_bin';
const WORD = 'CHARACTER SET ascii COLLATE ascii_bin';
const EXACT_TEXT = 'CHARACTER SET utf8mb4 COLLATE utf8mb4_bin';
const MS = 'BIGINT';

export async function up(knex: Knex): Promise<void> {
  // Of a stub only id, device, seq and hash are known: the other columns stay empty, and `stub_why` says why.
  // `monotonic_ms` is text, because the hash covers its digits and a DOUBLE may print others.
  await knex.raw(`
    CREATE TABLE entries (
      lab ${ID} NOT NULL,
      revision BIGINT UNSIGNED NOT NULL,
      id ${ID} NOT NULL,
      device ${ID} NOT NULL,
      seq BIGINT UNSIGNED NOT NULL,
      kind VARCHAR(48) ${WORD} NULL,
      version INT UNSIGNED NULL,
      subject ${ID} NULL,
      author ${ID} NULL,
      witness ${ID} NULL,
      base_epoch ${ID} NULL,
      base_revision BIGINT UNSIGNED NULL,
      base_hash ${HASH} NULL,
      wall_ms ${MS} NULL,
      offset_min SMALLINT NULL,
      zone VARCHAR(64) ${EXACT_TEXT} NULL,
      page_life ${ID} NULL,
      monotonic_ms VARCHAR(40) ${WORD} NULL,
      time_uncertain BOOLEAN NULL,
      body MEDIUMTEXT ${EXACT_TEXT} NULL,
      body_bytes INT UNSIGNED NOT NULL,
      body_sha ${HASH} NULL,
      entry_sha ${HASH} NOT NULL,
      stub_why VARCHAR(500) ${EXACT_TEXT} NULL,
      verdict VARCHAR(12) ${WORD} NOT NULL,
      reason TEXT ${EXACT_TEXT} NULL,
      received_ms ${MS} NOT NULL,
      chain_hash ${HASH} NOT NULL,
      PRIMARY KEY (lab, revision),
      UNIQUE KEY entries_id (lab, id),
      UNIQUE KEY entries_seq (lab, device, seq),
      KEY entries_subject (lab, subject, revision),
      KEY entries_verdict (lab, verdict, revision),
      CONSTRAINT entries_lab FOREIGN KEY (lab) REFERENCES labs (id),
      CONSTRAINT entries_device FOREIGN KEY (lab, device) REFERENCES devices (lab, id),
      CONSTRAINT entries_counting CHECK (revision >= 1 AND seq >= 1),
      CONSTRAINT entries_verdicts CHECK (verdict IN ('applied', 'irregular', 'held-back')),
      CONSTRAINT entries_reason CHECK ((verdict = 'applied') = (reason IS NULL)),
      CONSTRAINT entries_reason_json CHECK (reason IS NULL OR JSON_VALID(reason)),
      CONSTRAINT entries_whole CHECK (stub_why IS NOT NULL OR (
        kind IS NOT NULL AND version IS NOT NULL AND subject IS NOT NULL AND base_epoch IS NOT NULL
        AND base_revision IS NOT NULL AND base_hash IS NOT NULL AND wall_ms IS NOT NULL AND offset_min IS NOT NULL
        AND zone IS NOT NULL AND page_life IS NOT NULL AND monotonic_ms IS NOT NULL AND time_uncertain IS NOT NULL
        AND body IS NOT NULL AND body_sha IS NOT NULL)),
      CONSTRAINT entries_stub CHECK (stub_why IS NULL OR (kind IS NULL AND body IS NULL AND verdict = 'held-back'))
    )`);
  // The key leads with the id, not the kind, so that the judge fetches all that a batch names in one look.
  await knex.raw(`
    CREATE TABLE documents (
      lab ${ID} NOT NULL,
      id ${ID} NOT NULL,
      kind VARCHAR(16) ${WORD} NOT NULL,
      parent ${ID} NULL,
      list_state VARCHAR(16) ${WORD} NULL,
      made_revision BIGINT UNSIGNED NOT NULL,
      revision BIGINT UNSIGNED NOT NULL,
      doc JSON NOT NULL,
      PRIMARY KEY (lab, id, kind),
      KEY documents_made (lab, kind, made_revision),
      KEY documents_parent (lab, parent, kind, made_revision),
      KEY documents_state (lab, kind, list_state, made_revision),
      CONSTRAINT documents_lab FOREIGN KEY (lab) REFERENCES labs (id),
      CONSTRAINT documents_order CHECK (made_revision <= revision)
    )`);
}

export async function down(knex: Knex): Promise<void> {
  for (const table of ['documents', 'entries']) await knex.schema.dropTable(table);
}
