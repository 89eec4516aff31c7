import type { Answer } from '../units/answer';
import { checkNumber } from '../units/check-number';
import { computed } from '../units/computed';
import type { Result } from '../units/result';

/** Share of the old gas left after n volumes, perfectly mixed: e^-n. Dead corners keep more. */
export function purgeResidual(volumes: number): Result<Answer> {
  return computed(
    [checkNumber(volumes, { field: 'volumes', name: 'Volumes', unit: '', min: 0, max: 500 })],
    () => ({
      value: Math.exp(-volumes),
      unit: '1',
      model: 'Perfectly mixed purge',
      valid: 'inlet and outlet at opposite ends; dead corners keep more',
      relative: { below: 0.5, above: Math.min(1, Math.exp(volumes) - 1) },
    }),
  );
}

/** Volumes that a mixed purge needs down to a share left: ln(1/share). Round it up. */
export function purgeVolumes(share_left: number): Result<Answer> {
  return computed(
    [
      checkNumber(share_left, {
        field: 'share_left',
        name: 'Share of the old gas left',
        unit: '',
        min: 1e-9,
        max: 1,
      }),
    ],
    () => ({
      value: -Math.log(share_left),
      unit: '1',
      model: 'Perfectly mixed purge',
      valid: 'inlet and outlet at opposite ends; dead corners need more',
      relative: { below: 0.1, above: 0.5 },
    }),
  );
}
