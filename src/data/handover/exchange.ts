import { FOLD_VERSION } from '../../domain/book/fold';
import { helloAnswerSchema, PROTOCOL_VERSION, type HelloAnswer } from '../../domain/handover/wire';
import { fillMirror } from './fill';
import { nextStep, type RoundFacts } from './handover-plan';
import { went, type HandoverParts, type Setback, type StepOutcome } from './handover-ports';
import { forgetKnownSetAside, settleFork, settleReset } from './known';
import { pullPage } from './pull';
import { createPush } from './push';
import { toSetback } from './setback';

export type RoundOutcome = { readonly type: 'quiet'; readonly upgrade: boolean } | Setback;

const FORK_WORDS =
  'This tablet’s Book exists twice. What the server lacks goes on as a new tablet once somebody signs in.';

/** 20,000 entries in batches of 50 are 400 steps; a round that needs this many is going in a circle. */
const MOST_STEPS = 5000;
const GOING_ROUND = 'The handover does not come to an end.';

export type Exchange = ReturnType<typeof createExchange>;

/** One round of the handover, step by step as the plan says, until nothing is left to do or something stands against it. */
export function createExchange(parts: HandoverParts) {
  const push = createPush(parts);
  let lastHello: HelloAnswer | null = null;
  let mustReset = false;
  const noteReset = () => {
    mustReset = true;
    lastHello = null;
  };

  /** A start that was cut off between enrolling anew and moving the queue leaves entries under the old tablet. */
  const gatherQueue = async () => {
    const device = await parts.store.device();
    if (device === undefined || device.forked || device.keys === null) return;
    const { count } = await parts.store.waiting();
    if (count > (await parts.store.waitingOf(device.id))) await parts.store.moveToDevice(device.id);
  };

  const greet = async (signal: AbortSignal): Promise<StepOutcome<HelloAnswer>> => {
    await gatherQueue();
    const { epoch, revision, hash } = await parts.mirror.cursor();
    const { count, oldest_wall_ms } = await parts.store.waiting();
    const outcome = await parts.tokens.request('device', {
      method: 'POST',
      path: '/api/handover/hello',
      body: {
        protocol: PROTOCOL_VERSION,
        app_version: parts.app_version,
        fold_version: FOLD_VERSION,
        cursor: { epoch, revision, hash },
        acked_seq: await parts.store.ackedSeq(parts.device()),
        pending: { count, oldest_wall_ms },
      },
      schema: helloAnswerSchema,
      signal,
    });
    if (outcome.type !== 'ok') return toSetback(outcome);
    const hello = outcome.value;
    parts.here.learnServerTime(hello.server_ms);
    if (hello.state === 'revoked')
      return {
        type: 'paused',
        state: 'revoked',
        words: 'A lead revoked this tablet. What is on it stays on it.',
      };
    await parts.mirror.noteBackup(hello.backup_revision);
    return went(hello);
  };

  const facts = async (hello: HelloAnswer | null, news: News): Promise<RoundFacts> => {
    const cursor = await parts.mirror.cursor();
    const forked = (await parts.store.device())?.forked === true;
    return {
      greeted: hello !== null,
      reset: mustReset || (hello?.state === 'reset' && !news.wasReset),
      refilling: news.refill,
      filling: parts.view.filling(),
      waiting: (await parts.store.nextWaiting(parts.device(), 1)).length,
      forked,
      cursor: cursor.revision,
      head: Math.max(hello?.head ?? 0, news.head),
    };
  };

  return {
    /** Without `greet` the last hello still counts, so that each entry logged does not cost one. */
    round: async (
      signal: AbortSignal,
      { greet: anew }: { readonly greet: boolean },
    ): Promise<RoundOutcome> => {
      let hello: HelloAnswer | null = anew ? null : lastHello;
      const news: News = { wasReset: false, refill: false, head: 0, steps: 0 };
      for (;;) {
        if (signal.aborted) return { type: 'displaced' };
        const step = nextStep(await facts(hello, news));
        if (step === 'hello') {
          const greeted = await greet(signal);
          if (greeted.type !== 'went') return greeted;
          hello = greeted.value;
          lastHello = hello;
          continue;
        }
        if (step === 'done' || hello === null) break;
        news.steps += 1;
        if (news.steps > MOST_STEPS) return { type: 'later', state: 'trouble', words: GOING_ROUND };
        const setback = await take(step, { hello, news, signal });
        if (setback !== null) return setback;
        // Whoever says that the mirror is of another Book has to be asked first which Book that is.
        if (mustReset && lastHello === null) hello = null;
      }
      if ((await parts.store.device())?.forked === true)
        return { type: 'paused', state: 'fork', words: FORK_WORDS };
      return { type: 'quiet', upgrade: hello?.state === 'upgrade' };
    },
    /** The long poll between rounds; answers whether something came. */
    poll: async (wait_s: number, signal: AbortSignal): Promise<StepOutcome<boolean>> => {
      const pulled = await pullPage(parts, wait_s, signal);
      if (pulled.type !== 'went') return pulled;
      if (pulled.value.type === 'reset') noteReset();
      return went(pulled.value.type === 'reset' || pulled.value.came > 0);
    },
  };

  async function take(
    step: Exclude<ReturnType<typeof nextStep>, 'hello' | 'done'>,
    turn: Turn,
  ): Promise<Setback | null> {
    const { hello, news, signal } = turn;
    switch (step) {
      case 'reset': {
        const settled = await settleReset(parts, hello, signal);
        if (settled.type !== 'went') return settled;
        // A reset that was settled is over, also for the rounds that go on with this hello.
        lastHello = { ...hello, state: 'ok' };
        mustReset = false;
        news.wasReset = true;
        // What stands here is of a Book that is no more: nothing is ready on it until the new one has come.
        await parts.mirror.outdate();
        await parts.view.mirrorMoved([]);
        news.refill = true;
        return null;
      }
      case 'push': {
        const pushed = await push(hello.epoch, signal);
        if (pushed.type !== 'went') return pushed;
        return await afterPush(pushed.value, turn);
      }
      case 'fill': {
        const filled = await fillMirror(parts, signal);
        if (filled.type !== 'went') return filled;
        if (news.refill) await forgetKnownSetAside(parts, signal);
        news.refill = false;
        return null;
      }
      case 'pull': {
        const pulled = await pullPage(parts, 0, signal);
        if (pulled.type !== 'went') return pulled;
        if (pulled.value.type === 'reset') noteReset();
        else if (pulled.value.came === 0)
          return { type: 'later', state: 'trouble', words: 'The server names more entries than it gives.' };
        else news.head = Math.max(news.head, pulled.value.head);
        return null;
      }
    }
  }

  async function afterPush(
    pushed: Extract<Awaited<ReturnType<typeof push>>, { type: 'went' }>['value'],
    { hello, news, signal }: Turn,
  ): Promise<Setback | null> {
    if (pushed.type === 'reset') {
      noteReset();
      return null;
    }
    if (pushed.type === 'forked') {
      const settled = await settleFork(parts, hello, signal);
      return settled.type === 'went' ? null : settled;
    }
    if (pushed.type === 'taken') news.head = Math.max(news.head, pushed.head);
    await parts.view.ownChanged();
    parts.bus.post({ type: 'acknowledged' });
    return null;
  }
}

interface News {
  wasReset: boolean;
  refill: boolean;
  head: number;
  steps: number;
}

interface Turn {
  readonly hello: HelloAnswer;
  readonly news: News;
  readonly signal: AbortSignal;
}
