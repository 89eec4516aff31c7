import type { Screw } from '../../domain/alignment/screws';
import type { RigSpec, ScrewSpec } from '../../domain/book/rig-spec';

/** Good to so much where the rig does not say; common practice, no source. */
const FEELER_MM = 0.015;

/** What the rig's numbers say of its channel, as aligning needs it. */
export interface AlignmentSetting {
  readonly length_mm: number;
  readonly place_a_mm: number;
  readonly place_b_mm: number;
  readonly feeler_mm: number;
  readonly feeler_assumed: boolean;
  /** Mean of the two spacings of the revision. */
  readonly target_mm: number;
  readonly screws: readonly [ScrewSpec, ScrewSpec] | null;
  /** What the rig's numbers lack for a recommendation, in words; null where nothing is missing. */
  readonly missing: string | null;
}

export function alignmentSetting({ channel }: RigSpec): AlignmentSetting {
  const { length_mm, spacing_a_mm, spacing_b_mm, feeler_error_mm } = channel;
  const [first, second] = channel.screws ?? [];
  const both = first !== undefined && second !== undefined;
  return {
    length_mm,
    place_a_mm: channel.feeler_a_mm ?? 0,
    place_b_mm: channel.feeler_b_mm ?? length_mm,
    feeler_mm: feeler_error_mm ?? FEELER_MM,
    feeler_assumed: feeler_error_mm === undefined,
    target_mm: Number(((spacing_a_mm + spacing_b_mm) / 2).toFixed(3)),
    screws: both ? [first, second] : null,
    missing: both ? null : missingWords(first),
  };
}

function missingWords(first: ScrewSpec | undefined): string {
  const needed = 'where it stands, its pitch, its lever and which way of turning closes the gap';
  return first === undefined
    ? `The rig’s numbers name no screws. For each of the two: ${needed}.`
    : `The rig’s numbers name ${first.name} alone. The second screw is missing: ${needed}.`;
}

/** As the physics takes it: turns above 0 are clockwise, seen from the head. */
export function clockwiseScrew({ position_mm, pitch_mm, lever, closes }: ScrewSpec): Screw {
  return { place_mm: position_mm, pitch_mm, lever, sense: closes === 'clockwise' ? -1 : 1 };
}

/** What some eighths of a turn give at the screw, mm; above 0 opens. */
export function screwTravel_mm(screw: ScrewSpec, eighths_clockwise: number): number {
  return (eighths_clockwise / 8) * screw.pitch_mm * screw.lever * (screw.closes === 'clockwise' ? -1 : 1);
}
