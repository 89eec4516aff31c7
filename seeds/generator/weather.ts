import { DEMO_LAB_SETTINGS } from '../lab';
import type { Dice } from './dice';
import { rounded } from './rounded';

/** The room on one day. */
export interface Weather {
  readonly ambient_bar_abs: number;
  readonly temperature_C: number;
  readonly humidity_pct: number;
}

export function weatherOfDay(dice: Dice): Weather {
  return {
    ambient_bar_abs: rounded(DEMO_LAB_SETTINGS.ambient_bar_abs + dice.between(-0.009, 0.009), 3),
    temperature_C: rounded(DEMO_LAB_SETTINGS.ambient_C + dice.between(-1.5, 1.8), 1),
    humidity_pct: dice.whole(34, 56),
  };
}
