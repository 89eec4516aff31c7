import { describe, expect, it } from 'vitest';
import { createLogger } from './logger';

function logged(write: (logger: ReturnType<typeof createLogger>) => void): string {
  let text = '';
  write(createLogger('info', { write: (line: string) => void (text += line) }));
  return text;
}

describe('the log', () => {
  it('keeps secrets out, at the top and one level down', () => {
    const text = logged((logger) => {
      logger.info(
        { password: 'sesame-1', req: { headers: { authorization: 'sesame-2', cookie: 'sesame-3' } } },
        'in',
      );
      logger.info({ entry: { body: 'sesame-4' }, session: { token: 'sesame-5' } }, 'in');
    });
    expect(text).toContain('(not logged)');
    expect(text).not.toContain('sesame');
  });

  it('carries the bindings of a child, and the stack of an error', () => {
    const text = logged((logger) => {
      logger.child({ requestId: 'r-17' }).error({ error: new Error('broken') }, 'failed');
    });
    expect(JSON.parse(text)).toMatchObject({
      requestId: 'r-17',
      msg: 'failed',
      error: { message: 'broken' },
    });
    expect(text).toContain('logger.test.ts');
  });

  it('says nothing below its level', () => {
    expect(
      logged((logger) => {
        logger.debug('detail');
      }),
    ).toBe('');
  });
});
