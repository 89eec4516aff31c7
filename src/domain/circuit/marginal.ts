import type { Circuit } from './circuit-input';
import { MARGIN, type Run } from './integrate';

/**
 * Whether a run comes so close to the break of the channel that it may as well go the other way: a swing that falls
 * short of it by under 2 %, or the swing that fires and would not have gone 2 % beyond it.
 */
export function isMarginal({ channel }: Circuit, { watch, end, firingSwing_V }: Run): boolean {
  const { break_V } = channel;
  if (break_V === null) return false;
  if (firingSwing_V !== null && firingSwing_V < (1 + MARGIN) * break_V) return true;
  const close_V = (1 - MARGIN) * break_V;
  if (end.fired_s === null) return watch.peaks().channel_V.size >= close_V;
  const fired_s = end.fired_s;
  return watch.swings.some((swing) => swing.time_s < fired_s && swing.size >= close_V);
}
