import { existsSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { DEMO_LAB } from '../../seeds/lab';
import { DEMO_PEOPLE } from '../../seeds/people';
import { readConfig } from '../config';
import { createContext, type Context } from '../context';
import { createLogger } from '../logger';
import { seedDemoLab } from './seed-demo-lab';

const ifEmpty = process.argv.includes('--if-empty');
const read = readConfig(process.env);
if (read.type === 'config-problems') {
  for (const problem of read.problems) console.error(problem);
  process.exit(1);
}
const { config } = read;
/** Stands while the demo is being filled in, with the moment that its month is counted from. */
const unfinishedFile = path.join(config.folders.data, 'demo-unfinished.json');
const signInsFile = path.join(config.folders.data, 'demo-sign-ins.json');

const context = createContext({ config, log: createLogger('warn') });
try {
  await seed(context);
} catch (error) {
  console.error(error);
  process.exitCode = 1;
} finally {
  context.release();
  await context.close();
}

async function seed(server: Context): Promise<void> {
  const labs = await server.database('labs').select<{ id: string }[]>('id');
  const demo = labs.some(({ id }) => id === DEMO_LAB.id);
  const cutOff = demo ? readUnfinished() : undefined;
  if (labs.length > 0 && cutOff === undefined) {
    if (ifEmpty) return;
    console.error('There is a lab in this database already; the demo lab is filled into an empty one only.');
    process.exitCode = 1;
    return;
  }
  const now_ms = cutOff ?? Date.now();
  writeFileSync(unfinishedFile, JSON.stringify({ now_ms }));
  const { revision } = await seedDemoLab(server, now_ms);
  const signIns = DEMO_PEOPLE.map(({ name, role, email, password }) => ({ name, role, email, password }));
  writeFileSync(signInsFile, `${JSON.stringify(signIns, null, 2)}\n`, { mode: 0o600 });
  rmSync(unfinishedFile, { force: true });
  console.log(`Demo lab ${DEMO_LAB.name}: ${revision} entries.`);
}

function readUnfinished(): number | undefined {
  if (!existsSync(unfinishedFile)) return undefined;
  const parsed: unknown = JSON.parse(readFileSync(unfinishedFile, 'utf8'));
  if (
    typeof parsed === 'object' &&
    parsed !== null &&
    'now_ms' in parsed &&
    typeof parsed.now_ms === 'number'
  )
    return parsed.now_ms;
  throw new Error(`${unfinishedFile} is not what the seed writes; remove it and the database to begin anew`);
}
