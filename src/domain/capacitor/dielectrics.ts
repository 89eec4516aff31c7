import type { Answer, Warning } from '../units/answer';
import { checkNumber } from '../units/check-number';
import { computed } from '../units/computed';
import { ok, refused, type Result } from '../units/result';
import { petMinimumStrength } from './stress';

export const MATERIALS = [
  'PET',
  'polyimide',
  'LDPE',
  'polypropylene',
  'PTFE',
  'cellulose acetate',
  'FR4',
  'PMMA',
  'soda-lime glass',
  'barium titanate',
] as const;
export type Material = (typeof MATERIALS)[number];

/** What is known of an insulating material. Strengths are the low end of short tests at the thickness given. */
export interface Dielectric {
  readonly eps_r: { readonly value: number; readonly low: number; readonly high: number };
  readonly strength: { readonly kV_mm: number; readonly thickness_mm: number };
  /** Loss tangent from kHz to MHz. */
  readonly lossTangent: number;
  /** Share of the voltage that comes back after a short, at most. */
  readonly rebound: number;
  readonly source: string;
}

export const DIELECTRICS: Readonly<Record<Material, Dielectric>> = {
  PET: {
    eps_r: { value: 3.2, low: 2.9, high: 3.4 },
    strength: { kV_mm: 90, thickness_mm: 0.125 },
    lossTangent: 0.015,
    rebound: 0.05,
    source:
      'PET film data sheet by GB/T 13542.2 and GB/T 1408.1 (IEC 60243-1), read; loss at 1 MHz and rebound from memory',
  },
  polyimide: {
    eps_r: { value: 3.4, low: 3.2, high: 3.9 },
    strength: { kV_mm: 118, thickness_mm: 0.127 },
    lossTangent: 0.002,
    rebound: 0.01,
    source:
      'polyimide film specification by ASTM D149 and D150, minimum at 127 um and highest permittivity read; rest from memory',
  },
  LDPE: {
    eps_r: { value: 2.25, low: 2.2, high: 2.35 },
    strength: { kV_mm: 40, thickness_mm: 0.2 },
    lossTangent: 2e-4,
    rebound: 0.002,
    source: 'handbook values, from memory',
  },
  polypropylene: {
    eps_r: { value: 2.2, low: 2.15, high: 2.3 },
    strength: { kV_mm: 100, thickness_mm: 0.2 },
    lossTangent: 2e-4,
    rebound: 0.001,
    source: 'handbook values for biaxial film, from memory',
  },
  PTFE: {
    eps_r: { value: 2.1, low: 2, high: 2.15 },
    strength: { kV_mm: 40, thickness_mm: 0.2 },
    lossTangent: 2e-4,
    rebound: 0.001,
    source: 'handbook values, from memory',
  },
  'cellulose acetate': {
    eps_r: { value: 4, low: 3.5, high: 6 },
    strength: { kV_mm: 40, thickness_mm: 0.2 },
    lossTangent: 0.05,
    rebound: 0.05,
    source: 'handbook values, from memory and doubtful; less when damp',
  },
  FR4: {
    eps_r: { value: 4.5, low: 4.2, high: 4.8 },
    strength: { kV_mm: 20, thickness_mm: 0.2 },
    lossTangent: 0.02,
    rebound: 0.03,
    source: 'laminate data, from memory',
  },
  PMMA: {
    eps_r: { value: 3.1, low: 2.7, high: 3.5 },
    strength: { kV_mm: 15, thickness_mm: 1 },
    lossTangent: 0.04,
    rebound: 0.05,
    source: 'handbook values, from memory',
  },
  'soda-lime glass': {
    eps_r: { value: 7, low: 6.5, high: 7.5 },
    strength: { kV_mm: 10, thickness_mm: 1 },
    lossTangent: 0.01,
    rebound: 0.05,
    source: 'handbook values, from memory',
  },
  'barium titanate': {
    eps_r: { value: 3000, low: 1000, high: 10_000 },
    strength: { kV_mm: 3, thickness_mm: 5 },
    lossTangent: 0.01,
    rebound: 0.05,
    source: 'handbook values for high-permittivity ceramic, from memory',
  },
};

/** Thicker film is weaker, about as t^-0.45 (0.4 to 0.5, from memory). */
const THICKNESS_EXPONENT = -0.45;

/** Relative permittivity of a material at room temperature, with its published spread as the band. */
export function relativePermittivity(material: string): Result<Answer> {
  const found = findMaterial(material);
  if (!found.ok) return found;
  const { eps_r, source } = DIELECTRICS[found.value];
  return computed([], () => ({
    value: eps_r.value,
    unit: '1',
    model: `Table of dielectrics: ${source}`,
    valid: 'room temperature, low frequency to some MHz',
    relative: { below: 1 - eps_r.low / eps_r.value, above: eps_r.high / eps_r.value - 1 },
  }));
}

/**
 * Minimum short-term strength at a thickness, kV/mm; never the typical figure, which must not be used for hold-off.
 * Thicker than tested it falls as t^-0.45; thinner it is kept level, since nothing here founds more.
 */
export function minimumStrength(material: string, thickness_mm: number): Result<Answer> {
  const found = findMaterial(material);
  if (!found.ok) return found;
  const thickness = checkNumber(thickness_mm, {
    field: 'thickness_mm',
    name: 'Thickness',
    unit: 'mm',
    min: 0.001,
    max: 100,
  });
  if (!thickness.ok) return thickness;
  const { source } = DIELECTRICS[found.value];
  const strength = found.value === 'PET' ? petNear(thickness_mm) : DIELECTRICS[found.value].strength;
  const ratio = Math.max(1, thickness_mm / strength.thickness_mm);
  const far = thickness_mm > 3 * strength.thickness_mm || thickness_mm < strength.thickness_mm / 3;
  const warnings: readonly Warning[] = far
    ? [
        {
          type: 'extrapolated',
          words: 'Far from the thickness that was tested: take a test at your own thickness.',
        },
      ]
    : [];
  return computed([], () => ({
    value: strength.kV_mm * ratio ** THICKNESS_EXPONENT,
    unit: 'kV/mm',
    model: `Minimum at ${String(strength.thickness_mm)}\u2009mm: ${source}`,
    valid: 'new film, short test, small electrode; design to a third or a quarter of it',
    relative: far ? 0.3 : 0.15,
    warnings,
  }));
}

const PET_FROM_MM = 0.075;
const PET_TO_MM = 0.35;

/** The data sheet's fit at the nearest thickness that it covers. */
function petNear(thickness_mm: number): Dielectric['strength'] {
  const nearest_mm = Math.min(PET_TO_MM, Math.max(PET_FROM_MM, thickness_mm));
  const fit = petMinimumStrength(Number((nearest_mm * 1000).toPrecision(12)));
  return fit.ok ? { kV_mm: fit.value.value, thickness_mm: nearest_mm } : DIELECTRICS.PET.strength;
}

/**
 * Voltage that may come back on a shorted capacitor, V, at most: absorbed charge, 1 to 5 % in PET and acetate and under
 * 0.1 % in polypropylene and PTFE, from memory. Keep it shorted.
 */
export function reboundVoltage(material: string, voltage_V: number): Result<Answer> {
  const found = findMaterial(material);
  if (!found.ok) return found;
  return computed(
    [checkNumber(voltage_V, { field: 'voltage_V', name: 'Voltage', unit: 'V', min: 0, max: 1e6 })],
    () => {
      const value = DIELECTRICS[found.value].rebound * voltage_V;
      return {
        value,
        unit: 'V',
        model: 'Absorbed charge, upper end',
        valid: 'minutes after a short; the upper end of recalled values, so keep it shorted',
        relative: { below: 0.9, above: 0.5 },
        warnings:
          value > 50
            ? [{ type: 'rebound', words: 'It charges itself again after a short. Leave the short on.' }]
            : [],
      };
    },
  );
}

function findMaterial(name: string): Result<Material> {
  const plain = name.trim().toLowerCase();
  const alias = ALIASES[plain] ?? plain;
  const found = MATERIALS.find((material) => material.toLowerCase() === alias.toLowerCase());
  return found === undefined
    ? refused({
        type: 'material-unknown',
        field: 'material',
        words: `Material: not in the table. Choose ${MATERIALS.slice(0, -1).join(', ')} or ${MATERIALS.at(-1) ?? ''}.`,
      })
    : ok(found);
}

const ALIASES: Readonly<Record<string, Material>> = {
  mylar: 'PET',
  bopet: 'PET',
  pp: 'polypropylene',
  acrylic: 'PMMA',
  polyethylene: 'LDPE',
  glass: 'soda-lime glass',
  'soda lime glass': 'soda-lime glass',
};
