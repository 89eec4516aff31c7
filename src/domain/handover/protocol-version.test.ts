import * as z from 'zod/mini';
import { describe, expect, it } from 'vitest';
import { hashText } from '../book/length-prefixed';
import { problemSchema } from './problem';
import * as wire from './wire';

/**
 * Moves when any message between tablet and server changes its shape. Then: raise PROTOCOL_VERSION, add a line to
 * PROTOCOL_HISTORY, keep reading the older messages, and set the new hash here.
 */
const HASH_BY_VERSION: Readonly<Record<number, string>> = {
  1: '271ef8c06d805d1b098b6876d9822c9b90badce199b2c3e8c593d700be0ff255',
};

const messages = {
  hello: [wire.helloRequestSchema, wire.helloAnswerSchema],
  push: [wire.pushRequestSchema, wire.pushAnswerSchema],
  pull: [wire.pullAnswerSchema],
  snapshot: [wire.snapshotHeaderSchema, wire.snapshotTrailerSchema],
  known: [wire.knownRequestSchema, wire.knownAnswerSchema],
  problem: [problemSchema],
};

describe('the version of the protocol', () => {
  it('moves with the shape of its messages', () => {
    const shapes = Object.entries(messages).map(([name, schemas]) => [
      name,
      schemas.map((schema) => z.toJSONSchema(schema, { io: 'input' })),
    ]);
    expect(hashText(JSON.stringify(shapes))).toBe(HASH_BY_VERSION[wire.PROTOCOL_VERSION]);
  });

  it('has a line of history for each version', () => {
    expect(wire.PROTOCOL_HISTORY).toHaveLength(wire.PROTOCOL_VERSION);
    expect(wire.PROTOCOL_HISTORY.at(-1)).toMatch(new RegExp(`^${wire.PROTOCOL_VERSION}: `));
  });

  it('covers every message that wire.ts declares', () => {
    const declared = Object.keys(wire).filter((name) => /(Request|Answer|Header|Trailer)Schema$/.test(name));
    expect(declared).toHaveLength(Object.values(messages).flat().length - 1);
  });
});
