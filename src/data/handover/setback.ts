import type { LabOutcome } from '../session/tokens';
import type { Setback } from './handover-ports';

/** What an answer that is not the hoped-for one means for the round. */
export function toSetback(outcome: Exclude<LabOutcome<unknown>, { type: 'ok' }>): Setback {
  switch (outcome.type) {
    case 'no-network':
      return { type: 'later', state: 'no-network', words: outcome.words };
    case 'sign-in-needed':
      return { type: 'paused', state: 'sign-in-to-send', words: `Sign in to send. ${outcome.words}` };
    case 'revoked':
      return { type: 'paused', state: 'revoked', words: outcome.words };
    case 'problem': {
      const { code, problem } = outcome;
      if (code === 'not-signed-in')
        return { type: 'paused', state: 'sign-in-to-send', words: `Sign in to send. ${problem.detail}` };
      return { type: 'later', state: 'trouble', words: `${problem.detail} (request ${problem.request_id})` };
    }
  }
}
