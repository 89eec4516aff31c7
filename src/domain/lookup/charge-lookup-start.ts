import { capacitance_F, chargingOf } from '../rules/rig-figures';
import { gapStart } from './gap-lookup-start';
import type { Known, Start, StartFrom, Values } from './lookup';

const ASSUMED: Values = {
  supply_kV: 20,
  supply_mA: 1,
  supply_W: null,
  ballast_Mohm: 20,
  bleed_Mohm: null,
  capacitance_nF: 3,
  break_by: 'entered',
  low_kV: 13.8,
  break_kV: 15,
  high_kV: 17,
  blown: 'unblown',
  volume_cm3: 0.5,
  flow_L_min: null,
  wanted_Hz: null,
  envelope_Hz: null,
};

/** Supply, ballast, bleeds and gap of the rig, at the middle of its working pressures. */
export function chargeStart(from: StartFrom): Start {
  const { spec, envelope = null } = from;
  const gap = gapStart(from);
  const known: Record<string, Known> = { ...gap.known };
  for (const key of Object.keys(ASSUMED)) known[key] = 'assumed';
  if (spec === null) return { values: { ...gap.values, ...ASSUMED }, known };
  const { supply_kV, supply_mA, ballast_Mohm, bleed_Mohm } = chargingOf(spec);
  const first = capacitance_F(spec.first);
  const second = capacitance_F(spec.second);
  const farad =
    first.ok && second.ok ? first.value + (spec.topology === 'lc-inversion' ? second.value : 0) : null;
  const said: Values = {
    supply_kV,
    supply_mA,
    ballast_Mohm,
    bleed_Mohm,
    ...(farad === null ? {} : { capacitance_nF: farad * 1e9 }),
    break_by: 'gap',
    envelope_Hz: envelope?.max_rate_Hz ?? spec.envelope.max_rate_Hz,
  };
  for (const key of Object.keys(said)) known[key] = 'rig';
  return { values: { ...gap.values, ...ASSUMED, ...said }, known };
}
