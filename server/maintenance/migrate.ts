import { migrationSource } from '../../migrations/migration-source';
import { readConfig } from '../config';
import { createDatabase } from '../db/database';
import { migrateToLatest } from '../db/migrate';
import { refoldOutdatedLabs } from '../handover/refold';
import { createLogger } from '../logger';

const read = readConfig(process.env);
if (read.type === 'config-problems') {
  for (const problem of read.problems) console.error(problem);
  process.exit(1);
}
const database = createDatabase(read.config.database, createLogger('warn'));
try {
  const names = await migrateToLatest(database, migrationSource);
  const refolded = await refoldOutdatedLabs(database);
  if (refolded.length > 0) console.log(`Made the documents of ${refolded.length} labs anew.`);
  if (names.length > 0) console.log(`Database brought to ${names.at(-1) ?? ''}.`);
} catch (error) {
  console.error(error);
  process.exitCode = 1;
} finally {
  await database.destroy();
}
