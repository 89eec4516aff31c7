import { GAS_WORDS } from '../../domain/report/words';
import { formatFigure } from '../../domain/units/format-quantity';
import { eyeWords } from './eye-scale';
import { shownQuantity } from './reading-fields';
import type { FormValues } from './reading-form';

export type GroupKey = 'beam' | 'trigger' | 'channel';

export interface ReadingGroup {
  readonly key: GroupKey;
  readonly label: string;
  readonly fields: readonly (keyof FormValues)[];
}

export const READING_GROUPS: readonly ReadingGroup[] = [
  {
    key: 'beam',
    label: 'Spot by eye',
    fields: ['output_attenuators', 'output_eye', 'beam_x_mm', 'beam_y_mm'],
  },
  {
    key: 'trigger',
    label: 'Trigger',
    fields: ['trigger_delay_ns', 'trigger_jitter_ns', 'trigger_misses'],
  },
  { key: 'channel', label: 'Channel gas and dye', fields: ['channel_gas', 'dye_batch'] },
];

/** What a folded group holds, in one line; empty while it holds nothing. */
export function groupWords(values: FormValues, group: GroupKey): string {
  return WORDS[group](values)
    .filter((word) => word !== '')
    .join(', ');
}

/** "+2, −1" on the millimetre grid; empty while nobody has set the spot. */
export function beamWords({ beam_x_mm, beam_y_mm }: Pick<FormValues, 'beam_x_mm' | 'beam_y_mm'>): string {
  if (beam_x_mm === null || beam_y_mm === null) return '';
  return `${signed(beam_x_mm)}, ${signed(beam_y_mm)}`;
}

const WORDS: Readonly<Record<GroupKey, (values: FormValues) => readonly string[]>> = {
  beam: (values) => {
    const { output_attenuators, output_eye } = values;
    const at = beamWords(values);
    return [
      output_attenuators === null
        ? ''
        : `${output_attenuators} ${output_attenuators === 1 ? 'attenuator' : 'attenuators'}`,
      output_eye === null ? '' : `eye ${eyeWords(output_eye)}`,
      at === '' ? '' : `at ${at}\u2009mm`,
    ];
  },
  trigger: ({ trigger_delay_ns, trigger_jitter_ns, trigger_misses }) => [
    trigger_delay_ns === null
      ? ''
      : `delay ${shownQuantity(trigger_delay_ns, 'trigger_delay_ns') ?? ''}\u2009ns`,
    trigger_jitter_ns === null
      ? ''
      : `jitter ${shownQuantity(trigger_jitter_ns, 'trigger_jitter_ns') ?? ''}\u2009ns`,
    trigger_misses === null ? '' : `${trigger_misses} missed`,
  ],
  channel: ({ channel_gas, dye_batch }) => [
    channel_gas === null ? '' : `${GAS_WORDS[channel_gas]} in the channel`,
    dye_batch === null ? '' : `dye ${dye_batch}`,
  ],
};

function signed(mm: number): string {
  const text = formatFigure(mm, { digits: { decimals: Number.isInteger(mm) ? 0 : 1 }, rounding: 'nearest' });
  return mm > 0 ? `+${text}` : text;
}
