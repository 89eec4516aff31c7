export interface PersonHere {
  readonly id: string;
  readonly name: string;
  readonly has_pin: boolean;
  /** Wrong PINs in a row. */
  readonly failures: number;
  /** How long to wait before the next try, ms; 0 = now. As of when this was read. */
  readonly wait_ms: number;
  /** Only signing in online opens: no PIN yet, or ten wrong ones. */
  readonly needs_sign_in: boolean;
}

export type PinOutcome =
  | { readonly type: 'right'; readonly person: PersonHere }
  | { readonly type: 'wrong'; readonly words: string; readonly wait_ms: number; readonly failures: number }
  | { readonly type: 'wait'; readonly words: string; readonly wait_ms: number }
  | { readonly type: 'sign-in-needed'; readonly words: string }
  | { readonly type: 'not-saved'; readonly words: string };

export type SetPinOutcome =
  | { readonly type: 'set' }
  | { readonly type: 'refused'; readonly words: string }
  | { readonly type: 'not-saved'; readonly words: string };

export interface LabRef {
  readonly id: string;
  readonly name: string;
}

/** 'sign-in-needed': the Book opens, reads and writes, but this person's acts wait until they sign in (protocol 4.5). */
export type OnlineSession = 'signed-in' | 'sign-in-needed' | 'not-known';

export type LabSessionView =
  | { readonly state: 'locked'; readonly lab: LabRef; readonly people: readonly PersonHere[] }
  | {
      readonly state: 'open';
      readonly lab: LabRef;
      readonly people: readonly PersonHere[];
      readonly person: PersonHere;
      readonly online: OnlineSession;
    };

/** 'no-lab': nobody has enrolled this tablet yet. */
export type SessionView = { readonly state: 'no-lab' } | LabSessionView;

export interface SignInInput {
  readonly email: string;
  readonly password: string;
  readonly device_name: string;
  /** Left out: the lab that is open here, or the person's own; null: the person's own, whatever is open here. */
  readonly lab?: string | null;
}

export type SignInOutcome =
  | { readonly type: 'signed-in'; readonly person: PersonHere; readonly pin_needed: boolean }
  | { readonly type: 'refused'; readonly words: string }
  | { readonly type: 'slow-down'; readonly words: string; readonly retry_after_s: number }
  | { readonly type: 'no-network'; readonly words: string }
  | { readonly type: 'not-saved'; readonly words: string }
  | { readonly type: 'revoked'; readonly words: string };
