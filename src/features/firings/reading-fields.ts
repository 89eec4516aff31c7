import type { NumberRule } from '../../domain/units/check-number';
import { formatFigure } from '../../domain/units/format-quantity';

export const QUANTITY_KEYS = [
  'voltage_kV',
  'pressure_bar_g',
  'shots',
  'output_uJ',
  'flow_L_min',
  'rate_Hz',
  'ambient_bar_abs',
  'temperature_C',
  'humidity_pct',
  'output_attenuators',
  'beam_x_mm',
  'beam_y_mm',
  'trigger_delay_ns',
  'trigger_jitter_ns',
  'trigger_misses',
] as const;
export type QuantityKey = (typeof QUANTITY_KEYS)[number];

export interface QuantityTraits {
  readonly label: string;
  readonly unit: string;
  readonly step: number;
  /** Digits after the point that are always shown; more are shown when they were entered. */
  readonly decimals: number;
  readonly rule: NumberRule;
  /** May be left out: then nothing is stored for it. */
  readonly optional: boolean;
  /** Only whole numbers have a meaning. */
  readonly whole: boolean;
}

/** The rules are the bounds of the entry's own schema, so that what is taken here is never refused there. */
export const QUANTITY_TRAITS: Readonly<Record<QuantityKey, QuantityTraits>> = {
  voltage_kV: traits(
    'voltage_kV',
    { name: 'Voltage', unit: 'kV', min: 0, max: 200 },
    { step: 0.1, decimals: 1 },
  ),
  pressure_bar_g: traits(
    'pressure_bar_g',
    { name: 'Pressure', unit: 'bar(g)', min: -1.1, max: 20 },
    { step: 0.05, decimals: 2 },
  ),
  shots: traits(
    'shots',
    { name: 'Shots', unit: '', min: 0, max: 10_000_000 },
    { step: 1, decimals: 0, whole: true },
  ),
  output_uJ: traits(
    'output_uJ',
    { name: 'Output', unit: 'µJ', min: 0, max: 1e9 },
    { step: 5, decimals: 0, optional: true },
  ),
  flow_L_min: traits(
    'flow_L_min',
    { name: 'Flow', unit: 'L/min', min: 0, max: 500 },
    { step: 0.1, decimals: 1, optional: true },
  ),
  rate_Hz: traits(
    'rate_Hz',
    { name: 'Rate', unit: 'Hz', min: 0, minExcluded: true, max: 1000 },
    { step: 0.5, decimals: 1, optional: true },
  ),
  ambient_bar_abs: traits(
    'ambient_bar_abs',
    { name: 'Ambient', unit: 'bar(abs)', min: 0.3, max: 1.1 },
    { step: 0.001, decimals: 3 },
  ),
  temperature_C: traits(
    'temperature_C',
    { name: 'Temperature', unit: '°C', min: -40, max: 150 },
    { step: 1, decimals: 0 },
  ),
  humidity_pct: traits(
    'humidity_pct',
    { name: 'Humidity', unit: '%', min: 0, max: 100 },
    { step: 1, decimals: 0, optional: true },
  ),
  output_attenuators: traits(
    'output_attenuators',
    { name: 'Attenuators', unit: '', min: 0, max: 100 },
    { step: 1, decimals: 0, optional: true, whole: true },
  ),
  beam_x_mm: traits(
    'beam_x_mm',
    { name: 'Beam right of centre', unit: 'mm', min: -200, max: 200 },
    { step: 1, decimals: 0, optional: true },
  ),
  beam_y_mm: traits(
    'beam_y_mm',
    { name: 'Beam above centre', unit: 'mm', min: -200, max: 200 },
    { step: 1, decimals: 0, optional: true },
  ),
  trigger_delay_ns: traits(
    'trigger_delay_ns',
    { name: 'Delay', unit: 'ns', min: 0, max: 1e7 },
    { step: 10, decimals: 0, optional: true },
  ),
  trigger_jitter_ns: traits(
    'trigger_jitter_ns',
    { name: 'Jitter', unit: 'ns', min: 0, max: 1e6 },
    { step: 1, decimals: 0, optional: true },
  ),
  trigger_misses: traits(
    'trigger_misses',
    { name: 'Misses', unit: '', min: 0, max: 10_000_000 },
    { step: 1, decimals: 0, optional: true, whole: true },
  ),
};

export function isQuantity(key: string): key is QuantityKey {
  return Object.hasOwn(QUANTITY_TRAITS, key);
}

/** A value as its field shows it: every figure that was entered, and at least the field's own digits. */
export function shownQuantity(value: number | null, key: QuantityKey): string | null {
  if (value === null) return null;
  const entered = String(value).split('.')[1]?.length ?? 0;
  const decimals = Math.max(QUANTITY_TRAITS[key].decimals, Math.min(4, entered));
  return formatFigure(value, { digits: { decimals }, rounding: 'nearest' });
}

/** "18.9 kV", and "40 shots", for names and sentences. */
export function quantityWords(value: number, key: QuantityKey): string {
  const unit = key === 'shots' ? 'shots' : QUANTITY_TRAITS[key].unit;
  return `${shownQuantity(value, key) ?? ''}\u2009${unit}`;
}

type Bounds = Omit<NumberRule, 'field'>;

interface Steps {
  readonly step: number;
  readonly decimals: number;
  readonly optional?: true;
  readonly whole?: true;
}

function traits(
  field: QuantityKey,
  bounds: Bounds,
  { step, decimals, optional, whole }: Steps,
): QuantityTraits {
  return {
    label: bounds.name,
    unit: bounds.unit,
    step,
    decimals,
    rule: { ...bounds, field },
    optional: optional === true,
    whole: whole === true,
  };
}
