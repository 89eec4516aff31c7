import type { Setback } from './handover-ports';

export interface HandoverStatus {
  readonly state:
    | 'idle'
    | 'exchanging'
    | 'no-network'
    | 'sign-in-to-send'
    | 'revoked'
    | 'filling'
    | 'fork'
    | 'other-tab'
    | 'trouble';
  /** Wall clock of the last round that came through; null where none is known. */
  readonly last_exchange_ms: number | null;
  /** Own entries that the server has not taken. */
  readonly waiting: number;
  /** One line, shown as it is. */
  readonly words: string;
  /** The server is newer than this app: a notice, the handover goes on. */
  readonly upgrade: boolean;
}

export type Activity =
  | { readonly type: 'exchanging' }
  | { readonly type: 'idle' }
  | { readonly type: 'other-tab' }
  | Exclude<Setback, { type: 'displaced' }>;

export interface StatusFacts {
  readonly activity: Activity;
  readonly waiting: number;
  readonly filling: boolean;
  readonly last_exchange_ms: number | null;
  readonly upgrade: boolean;
}

export function handoverStatus(facts: StatusFacts): HandoverStatus {
  const { activity, waiting, filling, last_exchange_ms, upgrade } = facts;
  const kept = entriesWords(waiting);
  const at = (state: HandoverStatus['state'], words: string) => ({
    state,
    last_exchange_ms,
    waiting,
    words,
    upgrade,
  });
  switch (activity.type) {
    case 'later':
      return activity.state === 'no-network'
        ? at('no-network', `No network. ${kept}`)
        : at('trouble', `${activity.words} ${kept}`);
    case 'paused':
      return at(activity.state, `${activity.words} ${kept}`);
    case 'other-tab':
      return at('other-tab', `Another tab hands over. ${kept}`);
    case 'exchanging':
      return filling ? at('filling', 'Filling the Book.') : at('exchanging', `Handing over. ${kept}`);
    case 'idle':
      return at('idle', kept);
  }
}

export function entriesWords(waiting: number): string {
  if (waiting === 0) return 'Nothing waits on this tablet.';
  return waiting === 1 ? '1 entry on this tablet only.' : `${waiting} entries on this tablet only.`;
}
