import type { KitDoc } from '../book/documents/kit';
import { latestRevision, type RigDoc } from '../book/documents/rig';
import type { LabSettings } from '../book/rig-spec';
import { flowTime } from '../gas/cylinder';

/** A cylinder is changed with this much left in it, so that no air gets in; common practice, no source. */
export const REST_BAR_G = 5;
/** Gas for longer than a working day is no news. */
const TOLD_BELOW_MIN = 480;

export interface GasLeft {
  /** The piece of kit. */
  readonly cylinder: string;
  /** At the rig's own flow, rounded down. */
  readonly minutes: number;
  readonly why: string;
}

/**
 * Minutes of gas in the cylinders that stay with the rig, at the flow of its channel and down to 5 bar(g), by what the
 * gauge read last. Only nitrogen and air, whose compressibility is close to it; others say nothing, and so does a rig
 * without a flow.
 */
export function gasLeft(
  rig: RigDoc,
  register: readonly KitDoc[],
  settings: Pick<LabSettings, 'ambient_bar_abs' | 'ambient_C'>,
): readonly GasLeft[] {
  const { channel } = latestRevision(rig).spec;
  const flow_L_min = channel.flow_L_min ?? 0;
  if (flow_L_min <= 0) return [];
  return register.flatMap((kit): GasLeft[] => {
    const { item } = kit;
    if (item.type !== 'cylinder' || item.gas !== channel.gas || kit.state !== 'fit') return [];
    if (item.gas !== 'N2' && item.gas !== 'air') return [];
    if (kit.holder?.type !== 'rig' || kit.holder.id !== rig.id) return [];
    const read = `${kit.name} ${kit.number} at ${item.pressure_bar_g} bar(g)`;
    if (item.pressure_bar_g <= REST_BAR_G)
      return [{ cylinder: kit.id, minutes: 0, why: `${read}, which is what stays in it: change it.` }];
    const time = flowTime(
      {
        volume_L: item.water_L,
        pressure_bar_abs: item.pressure_bar_g + settings.ambient_bar_abs,
        temperature_C: settings.ambient_C,
      },
      { flow_L_min, rest_bar_abs: REST_BAR_G + settings.ambient_bar_abs },
    );
    if (!time.ok) return [];
    // The low end of the band: nobody is to run dry on a figure of ours.
    const minutes = Math.floor(time.value.band.low);
    if (minutes > TOLD_BELOW_MIN) return [];
    const why = `${read} when last read, ${flow_L_min} L/min, down to ${REST_BAR_G} bar(g).`;
    return [{ cylinder: kit.id, minutes, why }];
  });
}
