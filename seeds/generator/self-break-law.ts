import type { RigSpec } from '../../src/domain/book/rig-spec';
import { selfBreak, type GapAnswer } from '../../src/domain/gap/self-break';
import { gapInputOf } from '../../src/domain/rules/rig-gap';
import { must } from '../must';

/** State of the gap's gas and of the room at one reading. */
export interface GapState {
  readonly pressure_bar_g: number;
  readonly ambient_bar_abs: number;
  readonly temperature_C: number;
}

/** Self-break of a demo rig's gap with both sides, kV, as physics A(c) and M give it. */
export function selfBreakOf(spec: RigSpec, state: GapState): GapAnswer {
  return must(selfBreak(gapInputOf(spec, state)));
}
