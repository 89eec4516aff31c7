import { bankCapacitance } from '../capacitor/capacitance';
import { capacitanceAtVoltage, PART_CLASSES } from '../capacitor/parts';
import { formatFigure } from '../units/format-quantity';
import { ok, type Result } from '../units/result';
import type { CapacitorBody } from './capacitor-lookup-body';
import type { Entered } from './entered';
import { figureOf } from './figures';
import type { Figure } from './lookup';

/** A bank of bought parts: what it holds, at low voltage and at its own, and how far it is from its rating. */
export function bankBody(input: Entered): Result<CapacitorBody> {
  const part_F = input.number('part_nF') * 1e-9;
  const in_series = input.number('in_series');
  const capacitance = bankCapacitance([{ part_F, in_series, in_parallel: input.number('parts') }]);
  if (!capacitance.ok) return capacitance;
  const voltage_kV = input.number('voltage_kV');
  const each_kV = voltage_kV / in_series;
  const rated_kV = input.number('rated_kV');
  const margin: Figure = {
    key: 'margin',
    label: 'rated voltage over what one part carries',
    value: rated_kV / each_kV,
    unit: '',
    rounding: 'down',
    digits: 2,
    weight: 'main',
  };
  const over = each_kV > rated_kV;
  const shown = formatFigure(each_kV, { digits: { significant: 3 }, rounding: 'up' });
  return ok({
    capacitance: capacitance.value,
    // A ceramic's fall under voltage only takes from it: the printed value is the one to judge energy by.
    stored: capacitance.value,
    figures: [
      {
        key: 'each',
        label: 'voltage on one part',
        value: each_kV,
        unit: 'kV',
        rounding: 'up',
        digits: 3,
        weight: in_series === 1 ? 'side' : 'main',
      },
      margin,
      ...underVoltage(input, { part_F, each_kV }),
    ],
    warnings: [
      ...(over
        ? [{ type: 'over-rated', words: `Each part carries ${shown}\u2009kV and is rated for ${rated_kV}.` }]
        : []),
      ...(in_series > 1
        ? [
            {
              type: 'ungraded',
              words:
                'Parts in a string share the voltage only with grading resistors; without them one takes more.',
            },
          ]
        : []),
    ],
    cautions: [],
    plot: { y: 'energy', perKilovolt: 0, edgesFrom_kV: null, rated_kV: rated_kV * in_series },
  });
}

function underVoltage(
  input: Entered,
  { part_F, each_kV }: { readonly part_F: number; readonly each_kV: number },
): readonly Figure[] {
  const part = PART_CLASSES.find((name) => name === input.choice('part'));
  if (part === undefined) return [];
  const at = capacitanceAtVoltage({
    part,
    nominal_F: part_F,
    rated_V: input.number('rated_kV') * 1000,
    voltage_V: each_kV * 1000,
  });
  if (!at.ok) return [];
  return [
    figureOf(['under_voltage', 'capacitance at this voltage'], at.value, {
      rounding: 'nearest',
      times: (1e9 * input.number('parts')) / input.number('in_series'),
      unit: 'nF',
      ...(at.value.warnings[0] === undefined ? {} : { note: at.value.warnings[0].words }),
    }),
  ];
}
