import type { RigSpec, ScrewSpec } from '../book/rig-spec';
import { labAir } from './ambient-field';
import type { Known, Start, StartFrom } from './lookup';

const FEELER_MM = 0.015;
const NO_RIG = { length_mm: 300, spacing_a_mm: 3, spacing_b_mm: 3 };

/** From the rig's channel; what it does not say stands at common practice and says so. */
export function alignmentStart(from: StartFrom): Start {
  const { spec } = from;
  const air = labAir(from);
  const channel: Partial<RigSpec['channel']> & typeof NO_RIG = spec?.channel ?? NO_RIG;
  const { length_mm, spacing_a_mm, spacing_b_mm, screws } = channel;
  const rig: Known = spec === null ? 'assumed' : 'rig';
  const said = (value: unknown): Known => (value === undefined ? 'assumed' : 'rig');
  const [first, second] = [screws?.[0], screws?.[1]];
  return {
    values: {
      ambient_bar_abs: air.values.ambient_bar_abs,
      gap_a_mm: spacing_a_mm,
      gap_b_mm: spacing_b_mm,
      target_mm: Number(((spacing_a_mm + spacing_b_mm) / 2).toFixed(3)),
      feeler_mm: channel.feeler_error_mm ?? FEELER_MM,
      allowed_percent: 2,
      channel_bar_g: 0,
      length_mm,
      place_a_mm: channel.feeler_a_mm ?? 0,
      place_b_mm: channel.feeler_b_mm ?? length_mm,
      ...screwValues('1', first, 0),
      ...screwValues('2', second, length_mm),
    },
    known: {
      ambient_bar_abs: air.known.ambient_bar_abs,
      gap_a_mm: rig,
      gap_b_mm: rig,
      target_mm: rig,
      length_mm: rig,
      allowed_percent: 'assumed',
      channel_bar_g: 'assumed',
      feeler_mm: said(channel.feeler_error_mm),
      place_a_mm: said(channel.feeler_a_mm),
      place_b_mm: said(channel.feeler_b_mm),
      ...screwKnown('1', said(first)),
      ...screwKnown('2', said(second)),
    },
  };
}

function screwValues(number: string, screw: ScrewSpec | undefined, place_mm: number) {
  return {
    [`screw${number}_name`]: screw?.name ?? `screw ${number}`,
    [`screw${number}_place_mm`]: screw?.position_mm ?? place_mm,
    [`screw${number}_pitch_mm`]: screw?.pitch_mm ?? 0.5,
    [`screw${number}_lever`]: screw?.lever ?? 1,
    [`screw${number}_closes`]: screw?.closes ?? 'clockwise',
  };
}

function screwKnown(number: string, known: Known): Record<string, Known> {
  const keys = ['place_mm', 'pitch_mm', 'lever', 'closes'];
  return Object.fromEntries(keys.map((key) => [`screw${number}_${key}`, known]));
}
