import type { BodyOf } from '../../src/domain/book/kinds';
import { ADA, MILO, MORNING_MS, PureBook, type WriteOptions, type Written } from './pure-book';
import { testReading, testSheet, testSpec } from './test-lab';

const DAY_MS = 86_400_000;
export const ENVELOPE = { max_kV: 21, max_bar_g: 1.1, max_rate_Hz: 3 };

/** A rig with everything that Ada needs to fire it, up to the open firing or less. */
export class PureBench {
  readonly book = new PureBook();
  readonly rig: string;
  readonly sheet: string;
  permit = '';
  authorisation = '';
  check = '';
  firing = '';

  constructor() {
    this.rig = this.book.write('rig.created', null, {
      name: 'Kettle',
      number: '1A',
      spec: testSpec,
    }).entry.id;
    this.sheet = this.book.write(
      'sheet.published',
      null,
      { spec: testSheet, replaces: null },
      { by: MILO },
    ).entry.id;
  }

  authorise(until_ms = MORNING_MS + DAY_MS): this {
    const body = { rig: this.rig, task: 'fire' as const, until_ms, words: '' };
    this.authorisation = this.must(this.book.write('person.authorised', ADA, body, { by: MILO }));
    return this;
  }

  grant(until_ms = MORNING_MS + DAY_MS): this {
    const body = { rig_revision: this.rig, envelope: ENVELOPE, until_ms, words: '' };
    this.permit = this.must(this.book.write('permit.granted', this.rig, body, { by: MILO }));
    return this;
  }

  walk(options: WriteOptions = {}): this {
    const { book, rig, sheet } = this;
    this.check = this.must(book.write('check.opened', null, { rig, rig_revision: rig, sheet }, options));
    const step = { step: 'hands-out', result: { type: 'confirm' as const }, note: '' };
    this.must(book.write('check.step-done', this.check, step, options));
    this.must(book.write('check.closed', this.check, {}, options));
    return this;
  }

  ready(): this {
    return this.authorise().grant().walk();
  }

  open(more: Partial<BodyOf<'firing.opened'>> = {}, options: WriteOptions = {}): Written {
    const { rig } = this;
    const check = this.check === '' ? null : this.check;
    const permit = this.permit === '' ? null : this.permit;
    const body = { number: 'A-1', rig, rig_revision: rig, check, permit, unready: null, ...more };
    const written = this.book.write('firing.opened', null, body, options);
    this.firing = written.entry.id;
    return written;
  }

  read(more: Partial<typeof testReading> = {}, options: WriteOptions = {}): Written {
    return this.book.write('firing.reading', this.firing, { ...testReading, ...more }, options);
  }

  must(written: Written): string {
    if (written.verdict !== 'applied')
      throw new Error(`${written.entry.kind}: ${JSON.stringify(written.reason)}`);
    return written.entry.id;
  }
}
