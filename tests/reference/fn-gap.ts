import { rodFieldFactor } from '../../src/domain/gap/capped-rods';
import { cylinderBreakdown, fieldFactor, sphereBreakdown } from '../../src/domain/gap/curved-gap';
import { earlyBreakProbability } from '../../src/domain/gap/early-break';
import { airDensity, humidityFactor, type GapPoint } from '../../src/domain/gap/gas-density';
import type { GapInput } from '../../src/domain/gap/gap-input';
import { GAS_NAMES, TOWNSEND_CONSTANTS } from '../../src/domain/gap/gas-table';
import { hexBarBreakdown, hexFieldFactor } from '../../src/domain/gap/hex-bars';
import { highFieldFactor } from '../../src/domain/gap/high-field';
import {
  isMonotone,
  lowPdVoltage,
  paschenMinimumPd,
  paschenMinimumVoltage,
} from '../../src/domain/gap/low-pd';
import { martinPulseField, martinSpheres } from '../../src/domain/gap/martin';
import { needleGap } from '../../src/domain/gap/needle-gap';
import { holdOffLow, selfBreakHigh } from '../../src/domain/gap/self-break';
import { formativeTime, rampBreakdownField } from '../../src/domain/gap/time-lag';
import {
  forcedB,
  gammaFromMinimum,
  pdMinFromGamma,
  townsendOvershoot,
  townsendVoltage,
} from '../../src/domain/gap/townsend';
import {
  airFromGauge,
  airSibling,
  gapSensitivity,
  gaugeMistakeRatio,
  nitrogenToAirRatio,
  pressureForVoltage,
  uniformBreakdown,
} from '../../src/domain/gap/uniform-law';
import { erosionGrowth, purgeFlow } from '../../src/domain/gap/upkeep';
import { kilopascalToBar } from '../../src/domain/units/pressure';
import { refused, type Result } from '../../src/domain/units/result';
import type { ReferenceFunction } from './fn-table';
import type { Inputs } from './inputs';

// What the check format states where these are not among the inputs.
const SPHERE_TABLE_KPA = 101.3;
const REFERENCE_C = 20;

export const GAP_FUNCTIONS: Readonly<Record<string, ReferenceFunction>> = {
  'gap.airDensity': (i) => airDensity(i.number('p_kPa'), i.number('T_C')),
  'gap.humidityFactor': (i) => humidityFactor(i.number('h_g_m3'), i.number('delta')),
  'gap.breakdown.spheres': (i) =>
    sphereBreakdown({ ...pointOf(i, pressureOf(i)), diameter_cm: diameterOf(i) ?? Number.NaN }),
  'gap.breakdown.cylinders': (i) =>
    cylinderBreakdown({ ...pointOf(i, pressureOf(i)), radius_cm: i.number('R_cm') }),
  'gap.breakdown.hexBars': hexBarsOf,
  'gap.fieldFactorHex': hexFactorOf,
  'gap.fieldFactor': fieldFactorOf,
  'gap.martin.spheres': (i) =>
    martinSpheres({
      diameter_cm: diameterOf(i) ?? Number.NaN,
      gap_cm: i.number('d_cm'),
      pressure_bar_abs: pressureOf(i),
    }),
  'gap.martin.pulseField': (i) =>
    martinPulseField({
      time_us: i.number('t_us'),
      gap_cm: i.number('d_cm'),
      pressure_atm: i.number('p_atm', 1),
    }),
  'gap.highFieldFactor': (i) => highFieldFactor(i.number('E_MV_m')),
  'gap.nitrogenToAirRatio': (i) => nitrogenToAirRatio(i.number('x_bar_cm')),
  'gap.formativeTime': (i) => formativeTime(i.number('E_kV_cm'), i.number('rho_g_cm3')),
  'gap.rampBreakdownField': (i) => rampBreakdownField(i.number('dEdt_kV_cm_s'), i.number('rho_g_cm3')),
  'gap.prefireProbability': (i) => earlyBreakProbability(i.number('margin_sigma')),
  'gap.purgeFlow': (i) =>
    purgeFlow({ volume_cm3: i.number('V_cm3'), rate_Hz: i.number('f_Hz'), volumes: i.number('k', 3) }),
  'gap.erosionGrowth': (i) =>
    erosionGrowth({
      yield_ucm3_per_C: i.number('Y_ucm3_per_C'),
      charge_C: i.number('Q_C'),
      shots: i.number('N_shots'),
      area_cm2: i.number('A_wear_cm2'),
    }),
  'gap.paschenMinimum.voltage': (i) => paschenMinimumVoltage(i.text('gas')),
  'gap.paschenMinimum.pd': (i) => paschenMinimumPd(i.text('gas')),
  'gap.townsend.voltage': (i) =>
    townsendVoltage(
      { ...constantsOf(i), gamma: i.number('gamma') },
      i.number('pd_Torrcm'),
      i.has('gas') ? i.text('gas') : undefined,
    ),
  'gap.townsend.gammaFromMinimum': (i) =>
    gammaFromMinimum({ ...constantsOf(i), voltage_V: i.number('V_min_V') }),
  'gap.townsend.pdMinFromGamma': (i) => pdMinFromGamma({ ...constantsOf(i), voltage_V: i.number('V_min_V') }),
  'gap.townsend.forcedB': (i) => forcedB(i.number('V_min_V'), i.number('pd_min_Torrcm')),
  'gap.townsend.overshoot': (i) => townsendOvershoot(i.number('p_bar_abs'), i.number('d_cm')),
  'gap.uniform.air': (i) => uniformBreakdown('air', pointOf(i, i.number('p_bar_abs'))),
  'gap.uniform.N2': (i) => uniformBreakdown('N2', pointOf(i, i.number('p_bar_abs'))),
  'gap.uniform.SF6': (i) => uniformBreakdown('SF6', pointOf(i, i.number('p_bar_abs'))),
  'gap.uniform.airSibling': (i) => airSibling(i.number('x_atm_cm_at_293K')),
  'gap.uniform.airFromGauge': (i) =>
    airFromGauge(i.number('p_bar_gauge'), i.number('ambient_bar'), bareGapOf(i)),
  'gap.uniform.gaugeMistakeRatio': (i) =>
    gaugeMistakeRatio(i.number('p_bar_gauge'), i.number('ambient_bar'), bareGapOf(i)),
  'gap.uniform.lowPd': stitchedOf,
  'gap.uniform.isMonotone': (i) => isMonotone(i.text('gas')),
  'gap.uniform.pressureForVoltage': (i) => pressureForVoltage(i.number('V_kV'), bareGapOf(i)),
  'gap.uniform.sensitivity': (i) => gapSensitivity(i.number('p_bar_abs'), i.number('d_cm')),
  'gap.holdOff.low': (i) => twoSided(i, holdOffLow),
  'gap.selfBreak.high': (i) => twoSided(i, selfBreakHigh),
  'clearance.needleGap': (i) => needleGap(i.number('V_kV')),
};

function bareGapOf(i: Inputs) {
  return { gap_cm: i.number('d_cm'), temperature_C: i.number('T_C', REFERENCE_C) };
}

function pointOf(i: Inputs, pressure_bar_abs: number): GapPoint {
  return { ...bareGapOf(i), pressure_bar_abs };
}

function pressureOf(i: Inputs): number {
  return i.has('p_bar_abs') ? i.number('p_bar_abs') : kilopascalToBar(i.number('p_kPa', SPHERE_TABLE_KPA));
}

function diameterOf(i: Inputs): number | undefined {
  if (i.has('D_cm')) return i.number('D_cm');
  return i.has('R_cm') ? 2 * i.number('R_cm') : undefined;
}

// The stitched curve is asked for without a gas where air is meant.
function stitchedOf(i: Inputs) {
  return lowPdVoltage(i.has('gas') ? i.text('gas') : 'air', i.number('pd_Torrcm'));
}

function constantsOf(i: Inputs) {
  const known = i.has('gas') ? TOWNSEND_CONSTANTS[i.text('gas')] : undefined;
  return {
    A_per_cm_Torr: i.number('A', known?.A_per_cm_Torr),
    B_V_per_cm_Torr: i.number('B', known?.B_V_per_cm_Torr),
  };
}

function fieldFactorOf(i: Inputs) {
  if (i.text('geometry') === 'capped_rods')
    return rodFieldFactor(i.number('d_over_R'), i.number('L_over_R', 20));
  const geometry = i.oneOf('geometry', [
    'spheres_sym',
    'spheres_ground',
    'sphere_plane',
    'cylinders',
    'cylinder_plane',
  ]);
  return geometry.ok ? fieldFactor(geometry.value, i.number('d_over_R')) : geometry;
}

function orientationOf(i: Inputs) {
  return i.oneOf('orientation', ['flat', 'edge']);
}

function hexFactorOf(i: Inputs) {
  const orientation = orientationOf(i);
  if (!orientation.ok) return orientation;
  return hexFieldFactor({
    orientation: orientation.value,
    cornerOverFlats: i.number('rc_over_AF'),
    gapOverFlats: i.number('d_over_AF'),
  });
}

function hexBarsOf(i: Inputs) {
  const orientation = orientationOf(i);
  if (!orientation.ok) return orientation;
  return hexBarBreakdown({
    ...pointOf(i, pressureOf(i)),
    orientation: orientation.value,
    acrossFlats_mm: 10 * i.number('AF_cm'),
    cornerRadius_mm: 10 * i.number('rc_cm'),
  });
}

const SHAPES: Readonly<Record<string, GapInput['electrodes']['shape']>> = {
  uniform: 'plane',
  plane: 'plane',
  spheres: 'sphere',
  sphere: 'sphere',
  domed: 'domed',
  cylinders: 'cylinder',
  cylinder: 'cylinder',
};

function twoSided<T>(i: Inputs, side: (input: GapInput) => Result<T>): Result<T> {
  const gas = i.oneOf('gas', GAS_NAMES);
  if (!gas.ok) return gas;
  const shape = SHAPES[i.text('geometry')];
  if (shape === undefined) {
    return refused({ type: 'unknown-choice', words: `geometry "${i.text('geometry')}" is not known` });
  }
  const diameter_cm = diameterOf(i);
  return side({
    gas: gas.value,
    electrodes: { shape, radius_mm: diameter_cm === undefined ? undefined : 5 * diameter_cm },
    gap_mm: 10 * i.number('d_cm'),
    u_gap_mm: 10 * i.number('u_d_cm', 0),
    pressure: { bar_abs: i.number('p_bar_abs') },
    u_pressure_bar: i.number('u_p_bar', 0),
    temperature_C: i.number('T_C', REFERENCE_C),
    u_temperature_C: i.number('u_T_C', 0),
    irradiated: i.truth('irradiated', false),
  });
}
