import { answer, type Answer, type Basis } from '../units/answer';
import { checkNumber } from '../units/check-number';
import { formatQuantity } from '../units/format-quantity';
import { firstRefusal, ok, refused, type Result } from '../units/result';
import { INDUCTANCE_RULE } from './rules';

/** A sheet or strip line that carries the current of a gap. */
export interface Feed {
  readonly sheet_H: number;
  /** One-way transit. */
  readonly transit_s: number;
}

/**
 * Whether a circuit of lumped parts may stand for a sheet on a gap (physics L). `loop_H` is the inductance it has to be
 * given; with `steps` the true wave shape has steps of twice the transit; with `travelling` no circuit of lumped parts
 * gives the peak or the rise.
 */
export type LumpedVerdict = Basis & { readonly share: Answer } & (
    | {
        readonly type: 'lumped' | 'steps';
        readonly loop_H: number;
        /** The same with its band: what a third of the sheet gets wrong against the exact ring. */
        readonly loop: Answer;
        readonly words: string;
      }
    | { readonly type: 'travelling'; readonly words: string }
  );

const MODEL = 'Inductance of the sheet against its gap, rise against twice the transit';
const VALID = 'current along one direction of the sheet, one gap';

/** A sheet under this share of the gap\u2019s inductance does not show. */
const HIDDEN_SHARE = 0.1;
const LARGEST_SHARE = 1;
/** Open-ended line shorted at the other end: what its inductance counts for at the lowest ring. */
const SHEET_COUNTS = 1 / 3;

/**
 * Judges a sheet against the rest of its loop. `rise_s` is the rise that is wanted, or that a circuit came out with;
 * null where there is none yet.
 */
export function lumpedVerdict(
  gap_H: number,
  { sheet_H, transit_s }: Feed,
  rise_s: number | null = null,
): Result<LumpedVerdict> {
  const bad = firstRefusal([
    checkNumber(gap_H, { ...INDUCTANCE_RULE, field: 'gap_H', name: 'Inductance of the gap' }),
    checkNumber(sheet_H, { ...INDUCTANCE_RULE, field: 'sheet_H', name: 'Inductance of the sheet', min: 0 }),
    checkNumber(transit_s, { field: 'transit_s', name: 'Transit', unit: 's', min: 0, max: 1e-3 }),
    rise_s === null
      ? ok(0)
      : checkNumber(rise_s, { field: 'rise_s', name: 'Rise', unit: 's', min: 0, max: 1 }),
  ]);
  if (bad !== undefined) return refused(bad);
  const share = answer({
    value: sheet_H / gap_H,
    unit: '1',
    relative: 0.3,
    model: 'Inductance of the sheet over the gap\u2019s',
    valid: 'real straps within 30\u2009%',
  });
  const basis = { share, model: MODEL, valid: VALID, warnings: [] };
  const steps = `steps of ${formatQuantity(2e9 * transit_s, 'ns', { digits: { significant: 2 }, rounding: 'nearest' })}`;
  if (sheet_H > LARGEST_SHARE * gap_H) {
    return ok({
      ...basis,
      type: 'travelling',
      words: `The sheet has more inductance than its gap: waves run on it in ${steps}, and no circuit of lumped parts gives the peak or the rise.`,
    });
  }
  if (rise_s !== null && rise_s < 2 * transit_s) {
    return ok({
      ...basis,
      type: 'travelling',
      words: `The rise is shorter than twice the transit: waves run on the sheet in ${steps}, and no circuit of lumped parts gives the peak or the rise.`,
    });
  }
  const loop_H = gap_H + SHEET_COUNTS * sheet_H;
  if (sheet_H > HIDDEN_SHARE * gap_H) {
    return ok({
      ...basis,
      type: 'steps',
      loop_H,
      loop: loopAnswer(loop_H, 0.014),
      warnings: [{ type: 'steps', words: `The true wave shape has ${steps}.` }],
      words: `The sheet counts with a third of its inductance; the true wave shape has ${steps}.`,
    });
  }
  return ok({
    ...basis,
    type: 'lumped',
    loop_H,
    loop: loopAnswer(loop_H, 3e-4),
    words: 'The sheet is small against its gap: lumped parts stand for it.',
  });
}

/** The verdict for a loop that no sheet belongs to. */
export function withoutSheet(gap_H: number): LumpedVerdict {
  const share = answer({ value: 0, unit: '1', relative: 0, model: MODEL, valid: 'no sheet in the loop' });
  const loop = { ...loopAnswer(gap_H, 0), model: 'Gap alone' };
  return { type: 'lumped', loop_H: gap_H, loop, share, words: '', model: MODEL, valid: VALID, warnings: [] };
}

/** The ring goes with the root of the inductance: 0.7 % of it at equal inductances, 0.011 % at a tenth (physics L). */
function loopAnswer(value: number, relative: number): Answer {
  return answer({ value, unit: 'H', relative, model: 'Gap and a third of the sheet', valid: VALID });
}
