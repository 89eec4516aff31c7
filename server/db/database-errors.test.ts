import { describe, expect, it } from 'vitest';
import { isDatabaseError, isRetryable, withoutValues } from './database-errors';

function databaseError(more: Record<string, unknown>): Error {
  return Object.assign(
    new Error("insert into `people` values ('ada@bench.example', '$argon2id$secret')"),
    more,
  );
}

describe('errors of the database', () => {
  it('asks for the whole transaction again on deadlock, lock wait and changed record, and on nothing else', () => {
    for (const errno of [1213, 1205, 1020]) expect(isRetryable(databaseError({ errno }))).toBe(true);
    for (const errno of [1062, 4025, undefined]) expect(isRetryable(databaseError({ errno }))).toBe(false);
    expect(isRetryable('1213')).toBe(false);
  });

  it('knows one by its state, by its code, or by the driver calling it fatal', () => {
    expect(isDatabaseError(databaseError({ sqlState: '23000' }))).toBe(true);
    expect(isDatabaseError(databaseError({ code: 'ECONNREFUSED' }))).toBe(true);
    expect(isDatabaseError(databaseError({ fatal: true }))).toBe(true);
    expect(isDatabaseError(new Error('a bug'))).toBe(false);
    expect(isDatabaseError(databaseError({ code: 'ENOENT' }))).toBe(false);
  });

  it('tells the log what happened and where, without the values of the statement', () => {
    const error = databaseError({ errno: 1062, code: 'ER_DUP_ENTRY', sqlState: '23000', sql: 'secret' });
    const told = withoutValues(error);
    expect(told).toMatchObject({ errno: 1062, message: 'the database answered ER_DUP_ENTRY' });
    expect(JSON.stringify(told)).toContain('database-errors.test');
    expect(JSON.stringify(told)).not.toMatch(/secret|ada@/);
    const bug = new Error('a bug');
    expect(withoutValues(bug)).toBe(bug);
  });
});
