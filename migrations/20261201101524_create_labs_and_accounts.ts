import type { Knex } from 'knex';

// Ids and hashes are plain ASCII compared byte by byte; times are Unix milliseconds.
const ID = 'CHAR(36) CHARACTER SET ascii COLLATE ascii_bin';
const HASH = 'CHAR(64) CHARACTER SET ascii COLLATE ascii_bin';
const MS = 'BIGINT';

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
    CREATE TABLE labs (
      id ${ID} NOT NULL PRIMARY KEY,
      name VARCHAR(120) NOT NULL,
      epoch ${ID} NOT NULL,
      revision BIGINT UNSIGNED NOT NULL DEFAULT 0,
      chain_hash ${HASH} NOT NULL,
      fold_version INT UNSIGNED NOT NULL,
      backup_revision BIGINT UNSIGNED NOT NULL DEFAULT 0,
      tablets_enrolled INT UNSIGNED NOT NULL DEFAULT 0,
      created_ms ${MS} NOT NULL,
      CONSTRAINT labs_hash CHECK (chain_hash REGEXP '^[0-9a-f]{64}$'),
      CONSTRAINT labs_backup CHECK (backup_revision <= revision)
    )`);
  await knex.raw(`
    CREATE TABLE people (
      id ${ID} NOT NULL PRIMARY KEY,
      email VARCHAR(254) CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NOT NULL,
      name VARCHAR(120) NOT NULL,
      password_hash VARCHAR(255) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      created_ms ${MS} NOT NULL,
      UNIQUE KEY people_email (email),
      CONSTRAINT people_email_lower CHECK (BINARY email = BINARY LOWER(email))
    )`);
  await knex.raw(`
    CREATE TABLE memberships (
      lab ${ID} NOT NULL,
      person ${ID} NOT NULL,
      role VARCHAR(16) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      PRIMARY KEY (lab, person),
      KEY memberships_person (person),
      CONSTRAINT memberships_lab FOREIGN KEY (lab) REFERENCES labs (id),
      CONSTRAINT memberships_of FOREIGN KEY (person) REFERENCES people (id),
      CONSTRAINT memberships_role CHECK (role IN ('operator', 'reviewer', 'lead', 'reader'))
    )`);
  await knex.raw(`
    CREATE TABLE devices (
      lab ${ID} NOT NULL,
      id ${ID} NOT NULL,
      letter VARCHAR(8) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      name VARCHAR(120) NOT NULL,
      public_key VARCHAR(400) CHARACTER SET ascii COLLATE ascii_bin NULL,
      key_thumbprint VARCHAR(64) CHARACTER SET ascii COLLATE ascii_bin NULL,
      enrolled_ms ${MS} NOT NULL,
      enrolled_by ${ID} NULL,
      last_seq BIGINT UNSIGNED NOT NULL DEFAULT 0,
      last_seen_ms ${MS} NULL,
      app_version VARCHAR(60) NULL,
      pending_count INT UNSIGNED NULL,
      pending_oldest_wall_ms ${MS} NULL,
      forked_ms ${MS} NULL,
      revoked_ms ${MS} NULL,
      revoked_by ${ID} NULL,
      PRIMARY KEY (lab, id),
      UNIQUE KEY devices_letter (lab, letter),
      UNIQUE KEY devices_key (lab, key_thumbprint),
      CONSTRAINT devices_lab FOREIGN KEY (lab) REFERENCES labs (id),
      CONSTRAINT devices_letter_form CHECK (letter REGEXP '^([A-Z]+|0)$'),
      CONSTRAINT devices_key_whole CHECK ((public_key IS NULL) = (key_thumbprint IS NULL))
    )`);
  await knex.raw(`
    CREATE TABLE grants (
      lab ${ID} NOT NULL,
      device ${ID} NOT NULL,
      person ${ID} NOT NULL,
      granted_ms ${MS} NOT NULL,
      PRIMARY KEY (lab, device, person),
      CONSTRAINT grants_device FOREIGN KEY (lab, device) REFERENCES devices (lab, id),
      CONSTRAINT grants_person FOREIGN KEY (person) REFERENCES people (id)
    )`);
  await knex.raw(`
    CREATE TABLE refresh_tokens (
      lab ${ID} NOT NULL,
      token_sha ${HASH} NOT NULL,
      device ${ID} NOT NULL,
      person ${ID} NOT NULL,
      issued_ms ${MS} NOT NULL,
      expires_ms ${MS} NOT NULL,
      last_used_ms ${MS} NULL,
      PRIMARY KEY (lab, token_sha),
      KEY refresh_tokens_device (lab, device, person),
      CONSTRAINT refresh_tokens_device FOREIGN KEY (lab, device) REFERENCES devices (lab, id),
      CONSTRAINT refresh_tokens_person FOREIGN KEY (person) REFERENCES people (id),
      CONSTRAINT refresh_tokens_span CHECK (expires_ms > issued_ms)
    )`);
  await knex.raw(`
    CREATE TABLE sign_in_counts (
      counted_sha ${HASH} NOT NULL PRIMARY KEY,
      window_start_ms ${MS} NOT NULL,
      attempts INT UNSIGNED NOT NULL,
      KEY sign_in_counts_window (window_start_ms)
    )`);
  await knex.raw(`
    CREATE TABLE audit (
      lab ${ID} NOT NULL,
      id ${ID} NOT NULL,
      at_ms ${MS} NOT NULL,
      what VARCHAR(40) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      device ${ID} NULL,
      person ${ID} NULL,
      detail JSON NOT NULL,
      PRIMARY KEY (lab, id),
      KEY audit_at (lab, at_ms),
      CONSTRAINT audit_lab FOREIGN KEY (lab) REFERENCES labs (id)
    )`);
}

export async function down(knex: Knex): Promise<void> {
  for (const table of [
    'audit',
    'sign_in_counts',
    'refresh_tokens',
    'grants',
    'devices',
    'memberships',
    'people',
    'labs',
  ]) {
    await knex.schema.dropTable(table);
  }
}
