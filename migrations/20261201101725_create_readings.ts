import type { Knex } from 'knex';

const ID = 'CHAR(36) CHARACTER SET ascii COLLATE ascii_bin';
const WORD = 'VARCHAR(24) CHARACTER SET ascii COLLATE ascii_bin';

export async function up(knex: Knex): Promise<void> {
  // What each reading says now, flat, for plots and exports over years. The documents stay the source.
  await knex.raw(`
    CREATE TABLE readings (
      lab ${ID} NOT NULL,
      id ${ID} NOT NULL,
      firing ${ID} NOT NULL,
      rig ${ID} NOT NULL,
      no INT UNSIGNED NOT NULL,
      made_revision BIGINT UNSIGNED NOT NULL,
      revision BIGINT UNSIGNED NOT NULL,
      state ${WORD} NOT NULL,
      irregular ${WORD} NULL,
      corrected BOOLEAN NOT NULL,
      author ${ID} NULL,
      device ${ID} NOT NULL,
      wall_ms BIGINT NOT NULL,
      time_uncertain BOOLEAN NOT NULL,
      how ${WORD} NOT NULL,
      voltage_kV DOUBLE NOT NULL,
      pressure_bar_g DOUBLE NOT NULL,
      gas ${WORD} NOT NULL,
      flow_L_min DOUBLE NULL,
      rate_Hz DOUBLE NULL,
      shots INT UNSIGNED NOT NULL,
      looked ${WORD} NOT NULL,
      output_uJ DOUBLE NULL,
      ambient_bar_abs DOUBLE NOT NULL,
      temperature_C DOUBLE NOT NULL,
      humidity_pct DOUBLE NULL,
      PRIMARY KEY (lab, id),
      KEY readings_firing (lab, firing, no),
      KEY readings_rig (lab, rig, made_revision),
      CONSTRAINT readings_lab FOREIGN KEY (lab) REFERENCES labs (id),
      CONSTRAINT readings_state CHECK (state IN ('stands', 'struck', 'parted'))
    )`);
}

export async function down(knex: Knex): Promise<void> {
  await knex.schema.dropTable('readings');
}
