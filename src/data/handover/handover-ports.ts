import type { Bus, RandomBytes, Clock } from '../ports/ports';
import type { Journal } from '../journal/journal';
import type { Tokens } from '../session/tokens';
import type { BookStore } from '../store/book-store';
import type { MirrorStore } from '../store/mirror-store';
import type { BookView } from '../view/book-view';
import type { Here } from '../view/here';

/** What the handover works on. */
export interface HandoverParts {
  readonly store: BookStore;
  readonly mirror: MirrorStore;
  readonly view: BookView;
  readonly tokens: Tokens;
  readonly here: Here;
  readonly bus: Bus;
  readonly clock: Clock;
  readonly random: RandomBytes;
  readonly journal: () => Journal | null;
  readonly device: () => string;
  readonly app_version: string;
}

/** Why a step of the handover ended the round. */
export type Setback =
  /** Nobody answers, or the server is in trouble: try again later. */
  | { readonly type: 'later'; readonly state: 'no-network' | 'trouble'; readonly words: string }
  /** Nothing helps but what `state` says. */
  | {
      readonly type: 'paused';
      readonly state: 'sign-in-to-send' | 'revoked' | 'fork';
      readonly words: string;
    }
  /** Another tab moved the mirror: this one is not the exchanger any more. */
  | { readonly type: 'displaced' };

export type StepOutcome<T = null> = { readonly type: 'went'; readonly value: T } | Setback;

export function went<T>(value: T): StepOutcome<T> {
  return { type: 'went', value };
}
