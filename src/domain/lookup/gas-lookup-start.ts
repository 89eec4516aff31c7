import { labAir } from './ambient-field';
import type { Known, Start, StartFrom } from './lookup';

const ASSUMED = {
  subject: 'cylinder',
  gas: 'N2',
  cylinder_L: 50,
  cylinder_bar_g: 100,
  flow_L_min: 5,
  hours_day: 6,
  delivery_days: 10,
  rest_bar_g: 5,
  volume_cm3: 200,
  purge_bar_g: 0,
  volumes: 5,
  vessel_bar_g: 3,
  relief_bar_g: null,
  rated_bar_g: null,
  inner_mm: 40,
  wall_mm: 8,
  strength_MPa: null,
} as const;

/** Flow and vessel from the rig. What a cylinder holds and a wall carries nobody has said: all assumed, the strength empty. */
export function gasStart(from: StartFrom): Start {
  const { spec } = from;
  const air = labAir(from);
  const known: Record<string, Known> = { ...air.known };
  for (const key of Object.keys(ASSUMED)) known[key] = 'assumed';
  const vessel = spec?.gap.vessel ?? null;
  const said = {
    ...(spec === null ? {} : { gas: spec.channel.gas }),
    ...(spec?.channel.flow_L_min === undefined || spec.channel.flow_L_min === 0
      ? {}
      : { flow_L_min: spec.channel.flow_L_min }),
    ...(vessel === null
      ? {}
      : {
          vessel_bar_g: Math.max(0, vessel.regulator_max_bar_g),
          relief_bar_g: Math.max(0, vessel.relief_bar_g),
          rated_bar_g: vessel.rated_bar_g > 0 ? vessel.rated_bar_g : null,
        }),
  };
  for (const key of Object.keys(said)) known[key] = 'rig';
  return { values: { ...air.values, ...ASSUMED, ...said }, known };
}
