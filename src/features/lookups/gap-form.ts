import type { LabSettings, RigSpec } from '../../domain/book/rig-spec';
import type { GasName } from '../../domain/gap/gas-table';
import type { GapPurpose } from '../../domain/gap/gap-solve';
import { DIAL_ERRORS } from '../../domain/rules/rig-gap';
import { parseQuantity } from '../../domain/units/parse-number';
import type { NumberRule } from '../../domain/units/check-number';
import { ok, type Result } from '../../domain/units/result';

/** Quantities that a person may type; each keeps its last good value while a bad one is refused. */
export type GapField =
  'gap_mm' | 'pressure' | 'temperature_C' | 'ambient_bar_abs' | 'radius_mm' | 'voltage_kV';
export type Find = 'voltage' | 'pressure' | 'gap';
export type PressureReference = 'g' | 'abs';
export type Known = 'rig' | 'lab' | 'what-if';

export interface GapForm {
  readonly find: Find;
  /** What a pressure or gap is solved for; there is no default that leans by itself. */
  readonly purpose: GapPurpose;
  readonly gas: GasName;
  readonly irradiated: boolean;
  readonly gap_error_mm: number;
  readonly reference: PressureReference;
  readonly values: Readonly<Record<GapField, number | null>>;
  readonly known: Readonly<Record<GapField | 'gas' | 'irradiated', Known>>;
  readonly active: GapField;
  /** The text in the open Keypad; null while it is closed. */
  readonly typing: string | null;
  readonly refusal: string | null;
}

/** Prefilled from the rig in hand; "what if" never touches the rig. */
export function gapFormOf(spec: RigSpec, settings: LabSettings | undefined): GapForm {
  const { gap } = spec;
  return {
    find: 'voltage',
    purpose: 'hold-off-at-least',
    gas: gap.gas,
    irradiated: gap.irradiated,
    gap_error_mm: gap.gap_error_mm,
    reference: 'g',
    values: {
      gap_mm: gap.gap_mm,
      pressure: (gap.lowest_bar_g + gap.highest_bar_g) / 2,
      temperature_C: settings?.ambient_C ?? null,
      ambient_bar_abs: settings?.ambient_bar_abs ?? null,
      radius_mm: gap.radius_mm,
      voltage_kV: Math.min(spec.envelope.max_kV, spec.charging.supply_kV),
    },
    known: {
      gap_mm: 'rig',
      pressure: 'rig',
      temperature_C: 'lab',
      ambient_bar_abs: 'lab',
      radius_mm: 'rig',
      voltage_kV: 'rig',
      gas: 'rig',
      irradiated: 'rig',
    },
    active: 'pressure',
    typing: null,
    refusal: null,
  };
}

interface FieldTraits {
  readonly label: string;
  readonly unit: string;
  readonly step: number;
  readonly decimals: number;
  readonly rule: NumberRule;
}

const lowestGauge: NumberRule = { field: 'pressure', name: 'Pressure', unit: 'bar(g)', min: -1.1, max: 20 };
const lowestAbsolute: NumberRule = {
  field: 'pressure',
  name: 'Pressure',
  unit: 'bar(abs)',
  min: 0,
  minExcluded: true,
  minReason: 'absolute vacuum',
  max: 20,
};

export function fieldTraits(form: GapForm, field: GapField): FieldTraits {
  switch (field) {
    case 'gap_mm':
      return {
        label: 'Gap',
        unit: 'mm',
        step: 0.1,
        decimals: 2,
        rule: { field, name: 'Gap', unit: 'mm', min: 0.01, max: 500 },
      };
    case 'pressure':
      return {
        label: 'Pressure',
        unit: `bar(${form.reference})`,
        step: 0.05,
        decimals: 2,
        rule: pressureRule(form),
      };
    case 'temperature_C':
      return {
        label: 'Temperature',
        unit: '°C',
        step: 1,
        decimals: 0,
        rule: { field, name: 'Temperature', unit: '°C', min: -40, max: 150 },
      };
    case 'ambient_bar_abs':
      return {
        label: 'Ambient',
        unit: 'bar(abs)',
        step: 0.005,
        decimals: 3,
        rule: { field, name: 'Ambient', unit: 'bar(abs)', min: 0.3, max: 1.1 },
      };
    case 'radius_mm':
      return {
        label: 'Radius',
        unit: 'mm',
        step: 0.5,
        decimals: 1,
        rule: { field, name: 'Electrode radius', unit: 'mm', min: 0.1, max: 10_000 },
      };
    case 'voltage_kV':
      return {
        label: 'Voltage',
        unit: 'kV',
        step: 0.1,
        decimals: 1,
        rule: { field, name: 'Voltage', unit: 'kV', min: 0, minExcluded: true, max: 200 },
      };
  }
}

/** A gauge pressure below the ambient's own vacuum is refused with that vacuum named. */
function pressureRule(form: GapForm): NumberRule {
  if (form.reference === 'abs') return lowestAbsolute;
  const ambient = form.values.ambient_bar_abs;
  return ambient === null
    ? lowestGauge
    : { ...lowestGauge, min: -ambient, minExcluded: true, minReason: 'absolute vacuum at this ambient' };
}

/** Takes a typed text; a refusal stands beside the field and the value before it stays. */
export function enterField(form: GapForm, field: GapField, text: string): GapForm {
  const parsed = parseQuantity(text, fieldTraits(form, field).rule);
  if (!parsed.ok) return { ...form, active: field, refusal: parsed.refusal.words };
  return withValue({ ...form, typing: null }, field, parsed.value);
}

/** One step up or down on the grid of the field's step. */
export function stepField(form: GapForm, field: GapField, direction: -1 | 1): GapForm {
  const { step, decimals, rule } = fieldTraits(form, field);
  const now = form.values[field] ?? 0;
  const next = Number(((Math.round(now / step) + direction) * step).toFixed(Math.max(decimals, 3)));
  const checked = parseQuantity(String(next), rule);
  return checked.ok
    ? withValue(form, field, checked.value)
    : { ...form, active: field, refusal: checked.refusal.words };
}

/** Changes between gauge and absolute without changing the pressure; needs the ambient. */
export function changeReference(form: GapForm, reference: PressureReference): GapForm {
  const ambient = form.values.ambient_bar_abs;
  const pressure = form.values.pressure;
  if (form.reference === reference) return form;
  if (ambient === null || pressure === null) return { ...form, reference };
  const moved = reference === 'abs' ? pressure + ambient : pressure - ambient;
  return { ...form, reference, values: { ...form.values, pressure: Number(moved.toFixed(4)) } };
}

/** The pressure as the physics takes it; refused in words while the ambient is not known. */
export function absolutePressure(form: GapForm): Result<number> {
  const pressure = form.values.pressure;
  const rule = pressureRule(form);
  const checked = parseQuantity(pressure === null ? '' : String(pressure), rule);
  if (!checked.ok) return checked;
  if (form.reference === 'abs') return ok(checked.value);
  const ambient = form.values.ambient_bar_abs;
  if (ambient === null) {
    return {
      ok: false,
      refusal: {
        type: 'no-ambient',
        field: 'ambient_bar_abs',
        words: 'Ambient: enter the ambient pressure; it has no default.',
      },
    };
  }
  return ok(checked.value + ambient);
}

export const SETTING_ERRORS = DIAL_ERRORS;

function withValue(form: GapForm, field: GapField, value: number): GapForm {
  return {
    ...form,
    active: field,
    refusal: null,
    values: { ...form.values, [field]: value },
    known: { ...form.known, [field]: 'what-if' },
  };
}
