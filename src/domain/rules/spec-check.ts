import type { CapacitorSpec, LabSettings, RigSpec } from '../book/rig-spec';
import { plyThickness_m } from '../capacitor/capacitance';
import { dielectricStress } from '../capacitor/stress';
import { formatFigure } from '../units/format-quantity';

/** What stands against a rig's numbers taken together. */
export interface SpecObjection {
  readonly type: string;
  /** Path of the field that has to give way, as `specChanges` names it. */
  readonly field: string;
  /** Shown as it is: what contradicts what, and where to go. */
  readonly words: string;
}

export interface SpecCheck {
  /** They contradict each other: such a rig is not written down. */
  readonly refusals: readonly SpecObjection[];
  /** They can all be true, and then somebody should know it before the rig is charged. */
  readonly cautions: readonly SpecObjection[];
}

/**
 * Holds the numbers of a rig against each other. Each alone is in its range already (the schema sees to that). A fact that
 * is only dangerous is a caution and never a refusal: refusing to write it down would lose it. Rules of trade, no source.
 */
export function specCheck(spec: RigSpec, settings?: Pick<LabSettings, 'ambient_bar_abs'>): SpecCheck {
  return {
    refusals: [
      ...gapRefusals(spec, settings?.ambient_bar_abs ?? null),
      ...vesselRefusals(spec),
      ...circuitRefusals(spec),
      ...nodeRefusals(spec),
      ...shortingRefusals(spec),
      ...screwRefusals(spec),
      ...envelopeRefusals(spec),
    ],
    cautions: [
      ...gapCautions(spec),
      ...capacitorCautions(spec),
      ...bleedCautions(spec),
      ...shortingCautions(spec),
    ],
  };
}

function nameOf(topology: RigSpec['topology'], side: 'first' | 'second'): string {
  if (topology === 'lc-inversion') return side === 'first' ? 'C1' : 'C2';
  return side === 'first' ? 'the dump capacitor' : 'the peaking capacitor';
}

function* gapRefusals({ gap }: RigSpec, ambient_bar_abs: number | null): Generator<SpecObjection> {
  const { gap_mm, gap_error_mm, lowest_bar_g, highest_bar_g } = gap;
  if (gap_mm <= gap_error_mm)
    yield {
      type: 'gap-within-error',
      field: 'gap.gap_mm',
      words: `Gap: must be wider than its setting error of ${mm(gap_error_mm)}.`,
    };
  if (highest_bar_g < lowest_bar_g)
    yield {
      type: 'highest-below-lowest',
      field: 'gap.highest_bar_g',
      words: `Highest working pressure: below the lowest, ${bar(lowest_bar_g)}.`,
    };
  if (ambient_bar_abs !== null && lowest_bar_g + ambient_bar_abs <= 0)
    yield {
      type: 'below-vacuum',
      field: 'gap.lowest_bar_g',
      words: `Lowest working pressure: below vacuum, since ambient is ${ambient_bar_abs}\u2009bar(abs) here.`,
    };
}

function* vesselRefusals({ gap, envelope }: RigSpec): Generator<SpecObjection> {
  const { vessel, highest_bar_g } = gap;
  if (vessel === null) {
    if (highest_bar_g > 0)
      yield {
        type: 'pressure-without-vessel',
        field: 'gap.vessel',
        words: `Vessel: a gap at ${bar(highest_bar_g)} stands in one. Say what it is rated for, or take the pressure to 0\u2009bar(g).`,
      };
    return;
  }
  const { rated_bar_g, relief_bar_g } = vessel;
  if (relief_bar_g > rated_bar_g)
    yield {
      type: 'relief-above-rating',
      field: 'gap.vessel.relief_bar_g',
      words: `Relief valve: opens above what the vessel is rated for, ${bar(rated_bar_g)}. Set it lower.`,
    };
  const over = (value: number): string | null =>
    value > rated_bar_g
      ? `above the vessel’s ${bar(rated_bar_g)}.`
      : value > relief_bar_g
        ? `above the relief valve’s ${bar(relief_bar_g)}.`
        : null;
  const working = over(highest_bar_g);
  if (working !== null)
    yield {
      type: 'pressure-above-vessel',
      field: 'gap.highest_bar_g',
      words: `Highest working pressure: ${working}`,
    };
  const limit = over(envelope.max_bar_g);
  if (limit !== null)
    yield {
      type: 'envelope-above-vessel',
      field: 'envelope.max_bar_g',
      words: `Envelope pressure: ${limit}`,
    };
}

function* circuitRefusals({ topology, channel, charging }: RigSpec): Generator<SpecObjection> {
  if (topology !== 'lc-inversion') return;
  if (channel.across_kohm === null && charging.inductor_uH === undefined)
    yield {
      type: 'nothing-across-channel',
      field: 'channel.across_kohm',
      words:
        'Across the channel: an LC inversion charges C2 through something across its channel. Enter the resistor here or the inductor under charging.',
    };
}

function* nodeRefusals({ topology, nodes }: RigSpec): Generator<SpecObjection> {
  const twice = nodes.findIndex((node, i) => nodes.findIndex((one) => one.name === node.name) < i);
  if (twice >= 0)
    yield {
      type: 'node-twice',
      field: `nodes.${twice}.name`,
      words: `Node ${twice + 1}: another node has this name. Each needs one of its own.`,
    };
  // In a charge transfer the peaking capacitor is charged for the shot alone, unless a node says otherwise.
  const needed: readonly ('first' | 'second')[] =
    topology === 'lc-inversion' ? ['first', 'second'] : ['first'];
  for (const holds of needed) {
    if (!nodes.some((node) => node.holds === holds))
      yield {
        type: 'capacitor-without-node',
        field: 'nodes',
        words: `Nodes that stay charged: none holds ${nameOf(topology, holds)}. Add it, with its bleed.`,
      };
  }
}

function* shortingRefusals({ nodes, shorting_points: points }: RigSpec): Generator<SpecObjection> {
  const twice = points.findIndex((point, i) => points.indexOf(point) < i);
  if (twice >= 0)
    yield {
      type: 'shorting-point-twice',
      field: `shorting_points.${twice}`,
      words: `Shorting point ${twice + 1}: it is named twice. Short each by itself.`,
    };
  if (points.length < nodes.length)
    yield {
      type: 'node-without-shorting-point',
      field: 'shorting_points',
      words: `Shorting points: ${nodes.length} nodes stay charged by themselves, and there ${points.length === 1 ? 'is' : 'are'} only ${points.length} to short. Add one for each.`,
    };
}

function* screwRefusals({ channel }: RigSpec): Generator<SpecObjection> {
  const [one, other] = channel.screws ?? [];
  if (one !== undefined && other !== undefined) {
    if (one.position_mm === other.position_mm)
      yield {
        type: 'screws-in-one-place',
        field: 'channel.screws.1.position_mm',
        words: `Screw 2: both screws stand at ${mm(one.position_mm)} from the A end.`,
      };
    if (one.name === other.name)
      yield {
        type: 'screw-twice',
        field: 'channel.screws.1.name',
        words: 'Screw 2: both screws have the same name.',
      };
  }
  const { feeler_a_mm: a, feeler_b_mm: b } = channel;
  if (a !== undefined && b !== undefined && a >= b)
    yield {
      type: 'feelers-crossed',
      field: 'channel.feeler_b_mm',
      words: `Feeler, B side: must lie farther from the A end than the A side’s ${mm(a)}.`,
    };
}

function* envelopeRefusals({ envelope, charging, gap }: RigSpec): Generator<SpecObjection> {
  if (envelope.max_kV > charging.supply_kV)
    yield {
      type: 'envelope-above-supply',
      field: 'envelope.max_kV',
      words: `Envelope voltage: above the supply’s limit of ${charging.supply_kV}\u2009kV. Lower it, or correct the supply under charging.`,
    };
  if (gap.vessel === null && envelope.max_bar_g > 0)
    yield {
      type: 'envelope-without-vessel',
      field: 'envelope.max_bar_g',
      words: `Envelope pressure: above ambient, and the rig has no vessel.`,
    };
}

function* gapCautions({ gap, envelope }: RigSpec): Generator<SpecObjection> {
  const { electrodes, radius_mm, vessel, highest_bar_g } = gap;
  const shaped = electrodes === 'domed' || electrodes === 'cylinder' || electrodes === 'capped-rods';
  const missing =
    electrodes === 'hex-bars' ? missingOfBars(gap) : shaped && radius_mm === null ? 'radius_mm' : null;
  if (missing !== null)
    yield {
      type: 'shape-not-known',
      field: `gap.${missing}`,
      words: 'The shape of the electrodes is not known: no self-break voltage can be given.',
    };
  if (vessel !== null && vessel.regulator_max_bar_g > vessel.rated_bar_g)
    yield {
      type: 'regulator-above-rating',
      field: 'gap.vessel.regulator_max_bar_g',
      words: `The regulator can go past what the vessel is rated for, ${bar(vessel.rated_bar_g)}: only the relief valve stands between.`,
    };
  if (envelope.max_bar_g > highest_bar_g)
    yield {
      type: 'envelope-above-working',
      field: 'envelope.max_bar_g',
      words: `The envelope allows more than the highest working pressure, ${bar(highest_bar_g)}.`,
    };
}

function missingOfBars(gap: RigSpec['gap']): 'flats_mm' | 'corner_mm' | 'facing' | null {
  return (['flats_mm', 'corner_mm', 'facing'] as const).find((field) => gap[field] === undefined) ?? null;
}

function* capacitorCautions(spec: RigSpec): Generator<SpecObjection> {
  for (const side of ['first', 'second'] as const) {
    const words = capacitorWords(spec[side], spec.charging.supply_kV);
    if (words === null) continue;
    yield {
      type: 'capacitor-over-stressed',
      field: spec[side].kind === 'bank' ? `${side}.rated_kV` : `${side}.plies`,
      words: `On ${nameOf(spec.topology, side)}: ${words} A gap that stays shut lets the supply’s limit through.`,
    };
  }
}

function capacitorWords(capacitor: CapacitorSpec, supply_kV: number): string | null {
  if (capacitor.kind === 'bank')
    return capacitor.rated_kV < supply_kV
      ? `rated for ${capacitor.rated_kV}\u2009kV, and the supply gives ${supply_kV}\u2009kV.`
      : null;
  const thickness = plyThickness_m(capacitor.plies, capacitor.ply_um);
  if (!thickness.ok) return null;
  const stress = dielectricStress(supply_kV * 1000, thickness.value);
  if (!stress.ok || stress.value.value <= capacitor.strength_kV_mm) return null;
  const shown = formatFigure(stress.value.value, { digits: { significant: 3 }, rounding: 'up' });
  return `${shown}\u2009kV/mm at the supply’s limit, and the film is tested to ${capacitor.strength_kV_mm}\u2009kV/mm.`;
}

function* bleedCautions({ nodes }: RigSpec): Generator<SpecObjection> {
  for (const [i, node] of nodes.entries()) {
    if (node.bleed_Mohm === null)
      yield {
        type: 'bleed-not-known',
        field: `nodes.${i}.bleed_Mohm`,
        words: `The bleed of ${node.name} is not known: the rig gets no wait at all. Treat it as charged and short it with the stick.`,
      };
  }
}

/** Each capacitor, the middle plate and across the channel: in an LC inversion they hold charge apart from each other. */
const INVERSION_POINTS = 4;

function* shortingCautions({ topology, shorting_points }: RigSpec): Generator<SpecObjection> {
  if (topology === 'lc-inversion' && shorting_points.length < INVERSION_POINTS)
    yield {
      type: 'few-shorting-points',
      field: 'shorting_points',
      words:
        'In an LC inversion C1, C2, the middle plate and the channel are commonly shorted each by itself: the charging element may be open.',
    };
}

function bar(value: number): string {
  return `${String(value).replace('-', '\u2212')}\u2009bar(g)`;
}

function mm(value: number): string {
  return `${String(value).replace('-', '\u2212')}\u2009mm`;
}
