import { randomBytes, randomUUID } from 'node:crypto';
import { bodyText, sealEntry, type SealedEntry } from '../../src/domain/book/entry';
import { GENESIS_HASH } from '../../src/domain/book/ids';
import { versionOf, type BodyOf, type Kind } from '../../src/domain/book/kinds';
import type { LabSettings } from '../../src/domain/book/rig-spec';
import type { BookStore } from './book-store';
import { holdoffDomain, judgeBatch, type Domain } from './judge-batch';

export interface FoundingParts {
  readonly store: BookStore;
  readonly now: () => number;
}

export interface Founding {
  /** Made up here when it is not given. */
  readonly id?: string;
  readonly settings: LabSettings;
  /** The first lead, who has an account already. */
  readonly lead: { readonly id: string; readonly name: string };
  /** When it is founded; now unless a seed says otherwise. */
  readonly at_ms?: number;
}

export interface FoundedLab {
  readonly id: string;
  readonly epoch: string;
}

/**
 * Founds a lab: its Book begins with the first lead's `person.joined`, then `lab.set`, both written by a device of the
 * server's own (letter 0) in the lead's name. Only revision 1 is admitted without being judged, because nobody is
 * there yet who could admit anybody; it must be a lead joining by themselves. No route reaches this function, and it
 * works on a lab that does not exist only.
 */
export function createFounding({ store, now }: FoundingParts) {
  return async function foundLab(founding: Founding): Promise<FoundedLab> {
    const { id = randomUUID(), settings, lead, at_ms = now() } = founding;
    const epoch = randomUUID();
    const device = randomUUID();
    const seal = createServerPen({ lab: id, epoch, device, author: lead.id, at_ms });
    const joined = seal('person.joined', lead.id, { name: lead.name, role: 'lead' });
    const set = seal('lab.set', id, settings);
    const lab = { id, name: settings.name, epoch, device, made_ms: at_ms, lead: lead.id };
    await store.found(lab, async (writer) => {
      const { change, results } = await judgeBatch(writer, {
        items: [joined, set],
        session: lead.id,
        received_ms: at_ms,
        domain: admitting(joined),
        onFault: (_id, error) => {
          throw error;
        },
      });
      if (results.some((result) => result.outcome !== 'applied')) {
        throw new Error(`the founding of ${id} did not apply: ${JSON.stringify(results)}`);
      }
      await writer.append(change);
    });
    return { id, epoch };
  };
}

function admitting(first: SealedEntry): Domain {
  return {
    ...holdoffDomain,
    *judge(entry, context) {
      if (entry.id === first.id) return { verdict: 'applied', reason: null };
      return yield* holdoffDomain.judge(entry, context);
    },
  };
}

interface Pen {
  readonly lab: string;
  readonly epoch: string;
  readonly device: string;
  readonly author: string;
  readonly at_ms: number;
}

function createServerPen({ lab, epoch, device, author, at_ms }: Pen) {
  const page_life = randomUUID();
  let seq = 0;
  return function seal<K extends Kind>(kind: K, subject: string, body: BodyOf<K>): SealedEntry {
    seq += 1;
    return sealEntry(
      {
        lab,
        id: randomUUID(),
        device,
        seq,
        kind,
        version: versionOf(kind),
        subject,
        author,
        witness: null,
        base: { epoch, revision: 0, hash: GENESIS_HASH },
        stamp: {
          wall_ms: at_ms,
          offset_min: 0,
          zone: 'Etc/UTC',
          page_life,
          monotonic_ms: 0,
          time_uncertain: false,
        },
      },
      bodyText(body, randomBytes(16).toString('hex')),
    );
  };
}
