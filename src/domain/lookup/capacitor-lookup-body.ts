import type { Answer, Warning } from '../units/answer';
import type { Figure } from './lookup';

/** What a sheet and a bank answer alike: what they hold, and how hard they work. */
export interface CapacitorBody {
  /** At low voltage, F. */
  readonly capacitance: Answer;
  /** What the energy is counted with, F: never less than what stands at the voltage. */
  readonly stored: Answer;
  readonly figures: readonly Figure[];
  readonly warnings: readonly Warning[];
  readonly cautions: readonly string[];
  readonly plot: {
    readonly y: 'stress' | 'energy';
    /** Of the stress, in its own unit. */
    readonly perKilovolt: number;
    readonly limit?: { readonly y: number; readonly label: string };
    /** Above it bare foil edges discharge in air; null where that has no meaning. */
    readonly edgesFrom_kV: number | null;
    /** The rating of a bought part, kV. */
    readonly rated_kV?: number;
  };
}
