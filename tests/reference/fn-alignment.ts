import { bisectionTurns } from '../../src/domain/alignment/bisection';
import { allowedMismatch, breakdownSpread, wedge } from '../../src/domain/alignment/gap-line';
import { screwTurns } from '../../src/domain/alignment/screws';
import type { ReferenceFunction } from './fn-table';
import type { Inputs } from './inputs';

export const ALIGNMENT_FUNCTIONS: Readonly<Record<string, ReferenceFunction>> = {
  'alignment.turnsScrew1': (i) => screwTurns(settingOf(i), 0),
  'alignment.turnsScrew2': (i) => screwTurns(settingOf(i), 1),
  'alignment.wedge': (i) => wedge(gapOf(i)),
  'alignment.breakdownSpread': (i) =>
    breakdownSpread(i.number('g_left_mm'), i.number('g_right_mm'), i.number('p_bar_abs')),
  'alignment.allowedMismatch': (i) =>
    allowedMismatch(i.number('g_mm'), i.number('p_bar_abs'), i.number('spread')),
  'alignment.bisection': (i) => bisectionTurns(i.number('first_step_turns'), i.text('arc_side_sequence')),
};

function gapOf(i: Inputs) {
  return {
    left_mm: i.number('g_left_mm'),
    right_mm: i.number('g_right_mm'),
    leftPlace_mm: i.number('x_left_mm'),
    rightPlace_mm: i.number('x_right_mm'),
  };
}

function settingOf(i: Inputs) {
  return {
    gap: gapOf(i),
    target_mm: i.number('target_mm'),
    screws: [
      { place_mm: i.number('s1_mm'), pitch_mm: i.number('pitch1_mm') },
      { place_mm: i.number('s2_mm'), pitch_mm: i.number('pitch2_mm') },
    ],
  } as const;
}
