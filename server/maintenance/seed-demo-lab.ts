import { GENESIS_HASH } from '../../src/domain/book/ids';
import type { Base } from '../../src/domain/book/entry';
import { GRANTED, type Batch } from '../../seeds/generator/bench';
import { foundingTime, generateMonth } from '../../seeds/generator/generate-month';
import type { FoundingEntry } from '../../seeds/generator/memory-book';
import { DEMO_LAB, DEMO_LAB_SETTINGS, DEMO_TABLETS } from '../../seeds/lab';
import { DEMO_PEOPLE, INGE } from '../../seeds/people';
import type { Context } from '../context';

type Server = Pick<Context, 'database' | 'accounts' | 'handover'>;

/**
 * Fills the demo lab by the ways that people and tablets take: accounts, founding, handover. May be called again with
 * the same `now_ms` after it was cut off, and goes on from there: the same entries come, and the Book knows them by id.
 * Throws where the server judges an entry otherwise than the generator's own judge did. Answers the Book's head.
 */
export async function seedDemoLab(server: Server, now_ms: number): Promise<Base> {
  await addPeople(server);
  if (!(await isThere(server, 'labs', DEMO_LAB.id))) {
    const { id, name } = INGE;
    const at_ms = foundingTime(now_ms);
    await server.handover.foundLab({
      id: DEMO_LAB.id,
      settings: DEMO_LAB_SETTINGS,
      lead: { id, name },
      at_ms,
    });
  }
  await addTablets(server);
  const { epoch, founding } = await readFounding(server);
  const month = generateMonth({ now_ms, epoch, founding });
  for (const batch of month.batches) await handOver(server, batch);
  await requireSameHead(server, month.book.head());
  return month.book.head();
}

async function addPeople(server: Server): Promise<void> {
  for (const { id, email, name, password } of DEMO_PEOPLE) {
    if (!(await isThere(server, 'people', id)))
      await server.accounts.addPerson({ id, email, name, password });
  }
}

async function addTablets({ database, accounts }: Server): Promise<void> {
  for (const { id, name, letter } of DEMO_TABLETS) {
    const there = await database('devices').where({ lab: DEMO_LAB.id, id }).first<object | undefined>('id');
    if (there === undefined) {
      const added = await accounts.addTablet({ lab: DEMO_LAB.id, id, name });
      // Firings carry the letter in their numbers.
      if (added.letter !== letter)
        throw new Error(`demo tablet ${letter} was given the letter ${added.letter}`);
    }
    for (const person of GRANTED) await accounts.addGrant({ lab: DEMO_LAB.id, device: id, person });
  }
}

/** What the server's own device wrote when the lab was founded. */
async function readFounding({
  database,
  handover,
}: Server): Promise<{ epoch: string; founding: readonly FoundingEntry[] }> {
  const lab = DEMO_LAB.id;
  const [anyTablet] = DEMO_TABLETS;
  if (anyTablet === undefined) throw new Error('the demo lab has no tablet');
  const server = await database('devices')
    .where({ lab, letter: '0' })
    .first<{ id: string } | undefined>('id');
  const { epoch, entries } = await handover.service.pull({
    lab,
    device: anyTablet.id,
    since: 0,
    hash: GENESIS_HASH,
    limit: 20,
    wait_ms: 0,
    signal: new AbortController().signal,
  });
  const founding = entries.flatMap(({ entry, ...judged }) =>
    'stub' in entry || entry.device !== server?.id ? [] : [{ entry, ...judged }],
  );
  return { epoch, founding };
}

async function handOver(
  { handover }: Server,
  { tablet, session, received_ms, entries, outcomes }: Batch,
): Promise<void> {
  const { results } = await handover.service.push({
    lab: DEMO_LAB.id,
    device: tablet.id,
    session,
    entries,
    received_ms,
  });
  for (const [at, expected] of outcomes.entries()) {
    const got = results[at];
    if (got?.id === expected.id && got.outcome === expected.verdict && got.revision === expected.revision)
      continue;
    const kind = entries[at]?.kind ?? 'entry';
    throw new Error(
      `demo entry ${kind} ${expected.id} was to be ${expected.verdict} at revision ${expected.revision}, ` +
        `but the server answered ${JSON.stringify(got ?? 'nothing')}`,
    );
  }
}

/** Equal hashes say that every verdict and reason, and their order, are those of the generator. */
async function requireSameHead({ database }: Server, expected: Base): Promise<void> {
  const row = await database('labs')
    .where({ id: DEMO_LAB.id })
    .first<{ chain_hash: string } | undefined>('chain_hash');
  if (row?.chain_hash !== expected.hash)
    throw new Error('the demo Book does not end in the hash that was computed for it');
}

async function isThere({ database }: Server, table: 'labs' | 'people', id: string): Promise<boolean> {
  return (await database(table).where({ id }).first<object | undefined>('id')) !== undefined;
}
