import type { Answer } from '../units/answer';
import { checkNumber } from '../units/check-number';
import { computed } from '../units/computed';
import { ok, refused, type Result } from '../units/result';
import { CAPACITANCE_RULE, VOLTAGE_RULE } from './energy';

export const PART_CLASSES = [
  'high-permittivity ceramic',
  'strontium titanate ceramic',
  'polypropylene film',
  'mica',
] as const;
export type PartClass = (typeof PART_CLASSES)[number];

/** What a class of bought capacitors does under voltage. Falls are shares of the value at zero volts. */
export interface PartKind {
  /** Fall of the small-signal capacitance at the rated voltage: least and most within the class. */
  readonly fall: { readonly least: number; readonly most: number };
  /** Reversal that such parts are commonly rated for; 0.2 is "20 %". */
  readonly usualReversal: number;
  readonly source: string;
}

export const PART_KINDS: Readonly<Record<PartClass, PartKind>> = {
  'high-permittivity ceramic': {
    fall: { least: 0.2, most: 0.6 },
    usualReversal: 0.2,
    source: 'barium titanate doorknobs of classes X, Y and Z: 20 to 60 % at rated voltage, from memory',
  },
  'strontium titanate ceramic': {
    fall: { least: 0.02, most: 0.15 },
    usualReversal: 0.2,
    source: 'N4700 doorknobs fall far less, from memory',
  },
  'polypropylene film': {
    fall: { least: 0, most: 0 },
    usualReversal: 0.2,
    source: 'common practice, no source',
  },
  mica: { fall: { least: 0, most: 0.01 }, usualReversal: 0.9, source: 'common practice, no source' },
};

/** A bought capacitor at a voltage. */
export interface PartAtVoltage {
  readonly part: PartClass;
  readonly nominal_F: number;
  readonly rated_V: number;
  readonly voltage_V: number;
}

/**
 * Small-signal capacitance under voltage, F: C0 (1 - a V/Vrated), a the middle of the class. The straight fall is an
 * assumption; the band holds the whole class. Refused above the rated voltage.
 */
export function capacitanceAtVoltage(at: PartAtVoltage): Result<Answer> {
  const kind = checkedPart(at);
  if (!kind.ok) return kind;
  const { nominal_F, rated_V, voltage_V } = at;
  const { least, most } = kind.value.fall;
  const share = voltage_V / rated_V;
  const rest = (fall: number) => 1 - fall * share;
  const middle = rest(0.5 * (least + most));
  return computed([], () => ({
    value: nominal_F * middle,
    unit: 'F',
    model: `Straight fall up to the rated voltage; ${kind.value.source}`,
    valid: 'room temperature; heat and age move it further',
    relative: { below: 1 - rest(most) / middle, above: rest(least) / middle - 1 },
    warnings:
      most > 0.2
        ? [
            {
              type: 'voltage-coefficient',
              words: 'This class loses capacitance under voltage: measure it at V.',
            },
          ]
        : [],
  }));
}

/**
 * Energy of such a part, J: the integral of V dQ, C0 V^2 (1/2 - a u/3) with u = V/Vrated. The upper end of the band is
 * the one for cautions; round it up.
 */
export function energyAtVoltage(at: PartAtVoltage): Result<Answer> {
  const kind = checkedPart(at);
  if (!kind.ok) return kind;
  const { nominal_F, rated_V, voltage_V } = at;
  const { least, most } = kind.value.fall;
  const share = voltage_V / rated_V;
  const form = (fall: number) => 0.5 - (fall * share) / 3;
  const middle = form(0.5 * (least + most));
  return computed([], () => ({
    value: nominal_F * voltage_V ** 2 * middle,
    unit: 'J',
    model: 'Integral of V dQ with a straight fall of capacitance',
    valid: 'up to the rated voltage',
    relative: { below: 1 - form(most) / middle, above: form(least) / middle - 1 },
  }));
}

function checkedPart({ part, nominal_F, rated_V, voltage_V }: PartAtVoltage): Result<PartKind> {
  const nominal = checkNumber(nominal_F, CAPACITANCE_RULE);
  if (!nominal.ok) return nominal;
  const rated = checkNumber(rated_V, { ...VOLTAGE_RULE, field: 'rated_V', name: 'Rated voltage', min: 1 });
  if (!rated.ok) return rated;
  const voltage = checkNumber(voltage_V, {
    ...VOLTAGE_RULE,
    max: rated.value,
    maxReason: 'the rated voltage',
  });
  if (!voltage.ok) return voltage;
  const known = PART_CLASSES.find((name) => name === part);
  return known === undefined
    ? refused({
        type: 'part-unknown',
        field: 'part',
        words: 'Part: this class of capacitor is not in the table.',
      })
    : ok(PART_KINDS[known]);
}
