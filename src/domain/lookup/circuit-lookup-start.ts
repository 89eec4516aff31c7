import type { LabSettings, RigSpec } from '../book/rig-spec';
import { plyThickness_m } from '../capacitor/capacitance';
import { selfBreak } from '../gap/self-break';
import { CHANNEL_LAW, GAP_LAW, INDUCTOR_OHM, circuitOf, narrowest_mm } from '../rules/rig-circuit';
import { capacitance_F } from '../rules/rig-figures';
import { gapInputOf } from '../rules/rig-gap';
import { labAir } from './ambient-field';
import type { Known, Start, StartFrom, Values } from './lookup';

const ASSUMED: Values = {
  topology: 'charge-transfer',
  charge_kV: 15,
  first_nF: 3,
  second_by: 'value',
  second_nF: 0.9,
  ratio: 3.5,
  gap_by: 'known',
  gap_nH: 25,
  loop_long_mm: 50,
  loop_short_mm: 30,
  wire_radius_mm: 1,
  strap_length_mm: 60,
  strap_width_mm: 40,
  strap_spacing_mm: 10,
  return_mm: null,
  channel_by: 'known',
  channel_nH: 4,
  section_mm2: 200,
  channel_length_mm: 240,
  feed: 'parts',
  feed_along_mm: 300,
  feed_across_mm: 300,
  feed_thickness_mm: 0.7,
  feed_eps_r: 3.2,
  feed_pairs: 1,
  wanted_rise_ns: null,
  gap_law: GAP_LAW.law,
  gap_mm: 3,
  pressure_bar_g: 0.5,
  rw_constant: GAP_LAW.constant_cm2_atm_V2s,
  gap_fall_ns: GAP_LAW.fall_ns,
  gap_start_ohm: GAP_LAW.start_ohm,
  gap_end_ohm: GAP_LAW.end_ohm,
  channel_gas: 'N2',
  spacing_mm: 3,
  break_by: 'static',
  over_static: CHANNEL_LAW.over_static,
  break_kV: 12,
  channel_start_ohm: CHANNEL_LAW.start_ohm,
  channel_end_ohm: CHANNEL_LAW.end_ohm,
  channel_fall_ns: CHANNEL_LAW.fall_ns,
  oxygen_percent: null,
  charging_by: 'resistor',
  across_kohm: 50,
  inductor_uH: 10,
  inductor_ohm: INDUCTOR_OHM,
  supply_kV: null,
  supply_mA: null,
  window_ns: null,
};

/** The rig as it stands, fired at its self-break by the law in the middle of its working pressures. */
export function circuitStart(from: StartFrom): Start {
  const { spec, settings } = from;
  const air = labAir(from);
  const known: Record<string, Known> = { ...air.known };
  for (const key of Object.keys(ASSUMED)) known[key] = 'assumed';
  if (spec === null) return { values: { ...air.values, ...ASSUMED }, known };
  const said = saidBy(spec);
  const laws = lawValues(spec);
  const charge = settings === null ? {} : chargeAt(spec, settings);
  for (const key of Object.keys({ ...said, ...charge })) known[key] = 'rig';
  if (spec.model.known === 'assumed') {
    known['gap_nH'] = 'assumed';
    known['channel_nH'] = 'assumed';
  }
  if (spec.model.gap_law?.known === 'measured') {
    for (const key of ['gap_law', 'rw_constant', 'gap_fall_ns', 'gap_start_ohm', 'gap_end_ohm'])
      known[key] = 'rig';
  }
  if (spec.model.channel_law?.known === 'measured') {
    for (const key of ['over_static', 'channel_start_ohm', 'channel_end_ohm', 'channel_fall_ns'])
      known[key] = 'rig';
  }
  return { values: { ...air.values, ...ASSUMED, ...laws, ...said, ...charge }, known };
}

function saidBy(spec: RigSpec): Values {
  const { topology, gap, channel, charging, model, nodes } = spec;
  const first = capacitance_F(spec.first);
  const second = capacitance_F(spec.second);
  const bleed = nodes.find((node) => node.holds === 'second')?.bleed_Mohm ?? null;
  const element = elementOf(spec);
  return {
    topology,
    charge_kV: spec.envelope.max_kV,
    ...(first.ok ? { first_nF: first.value * 1e9 } : {}),
    ...(second.ok ? { second_nF: second.value * 1e9 } : {}),
    ...(first.ok && second.ok ? { ratio: first.value / second.value } : {}),
    gap_nH: model.gap_nH,
    channel_nH: model.channel_nH,
    channel_length_mm: channel.length_mm,
    ...sheetValues(spec),
    gap_mm: gap.gap_mm,
    pressure_bar_g: (gap.lowest_bar_g + gap.highest_bar_g) / 2,
    channel_gas: channel.gas,
    spacing_mm: narrowest_mm(channel),
    charging_by: element,
    across_kohm:
      channel.across_kohm ?? (topology === 'charge-transfer' && bleed !== null ? bleed * 1000 : null),
    ...(charging.inductor_uH === undefined ? {} : { inductor_uH: charging.inductor_uH }),
    ...(charging.inductor_ohm === undefined ? {} : { inductor_ohm: charging.inductor_ohm }),
    supply_kV: charging.supply_kV,
    supply_mA: charging.supply_mA,
  };
}

/** Which of the two the rig's circuit takes, so that both give the same digits. */
function elementOf(spec: RigSpec): 'resistor' | 'inductor' {
  if (spec.topology !== 'lc-inversion' || spec.charging.inductor_uH === undefined) return 'resistor';
  const point = { charge_kV: 1, pressure_bar_abs: 1, ambient_bar_abs: 1, temperature_C: 20 };
  const rig = circuitOf(spec, point);
  return rig.ok && rig.value.parts.charging_uH === spec.charging.inductor_uH ? 'inductor' : 'resistor';
}

function sheetValues({ first }: RigSpec): Values {
  if (first.kind === 'bank') return { feed: 'parts' };
  const thickness = plyThickness_m(first.plies, first.ply_um);
  return {
    feed: 'sheet',
    feed_along_mm: Math.max(first.length_mm, first.width_mm),
    feed_across_mm: Math.min(first.length_mm, first.width_mm),
    ...(thickness.ok ? { feed_thickness_mm: thickness.value * 1000 } : {}),
    feed_eps_r: first.eps_r,
    feed_pairs: first.plate_pairs,
  };
}

function lawValues({ model }: RigSpec): Values {
  const gap = model.gap_law;
  const channel = model.channel_law;
  return {
    ...(gap === undefined
      ? {}
      : {
          gap_law: gap.law,
          gap_start_ohm: gap.start_ohm,
          gap_end_ohm: gap.end_ohm,
          rw_constant: gap.constant_cm2_atm_V2s ?? GAP_LAW.constant_cm2_atm_V2s,
          gap_fall_ns: gap.fall_ns ?? GAP_LAW.fall_ns,
        }),
    ...(channel === undefined
      ? {}
      : {
          over_static: channel.over_static,
          channel_start_ohm: channel.start_ohm,
          channel_end_ohm: channel.end_ohm,
          channel_fall_ns: channel.fall_ns,
        }),
  };
}

function chargeAt(spec: RigSpec, { ambient_bar_abs, ambient_C }: LabSettings): Values {
  const pressure_bar_g = (spec.gap.lowest_bar_g + spec.gap.highest_bar_g) / 2;
  const broken = selfBreak(gapInputOf(spec, { pressure_bar_g, ambient_bar_abs, temperature_C: ambient_C }));
  return broken.ok ? { charge_kV: broken.value.law_kV } : {};
}
