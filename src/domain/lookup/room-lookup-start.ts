import { storedAt_J } from '../rules/rig-figures';
import { rigPulse } from '../rules/rig-pulse';
import { labAir } from './ambient-field';
import type { Known, Start, StartFrom, Values } from './lookup';

const ASSUMED = {
  subject: 'oxygen',
  room_m3: 20,
  air_changes_h: 0.5,
  flow_L_min: 5,
  hours: 8,
  cylinder_L: 50,
  cylinder_bar_g: 200,
  corona_W: 1,
  yield_g_kWh: 50,
  decay_h: 1,
  shot_J: 1,
  rate_Hz: 10,
  distance_m: 1,
  loop_cm2: 10,
  lead_cm2: 10,
  current_A: 5000,
  quarter_ns: 10,
} as const;

/** A small room with little air is assumed until somebody says otherwise; flow, energy, rate and current come from the rig. */
export function roomStart(from: StartFrom): Start {
  const { spec } = from;
  const air = labAir(from);
  const known: Record<string, Known> = { ...air.known };
  for (const key of Object.keys(ASSUMED)) known[key] = 'assumed';
  if (spec === null) return { values: { ...air.values, ...ASSUMED }, known };
  const stored = storedAt_J(spec, spec.charging.supply_kV);
  const pulse = rigPulse(spec);
  const said: Values = {
    rate_Hz: spec.envelope.max_rate_Hz,
    ...(spec.channel.flow_L_min === undefined ? {} : { flow_L_min: spec.channel.flow_L_min }),
    ...(stored.ok ? { shot_J: stored.value } : {}),
    ...(pulse.ok ? { current_A: pulse.value.current_A, quarter_ns: pulse.value.quarter_ns } : {}),
  };
  for (const key of Object.keys(said)) known[key] = 'rig';
  const { supply_kV, supply_mA } = spec.charging;
  return { values: { ...air.values, ...ASSUMED, ...said, supply_kV, supply_mA }, known };
}
