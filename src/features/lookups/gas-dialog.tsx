import { Choice } from '../../components/choice';
import { Dialog } from '../../components/dialog';
import { GAS_NAMES, type GasName } from '../../domain/gap/gas-table';
import type { GapForm } from './gap-form';

interface Props {
  readonly form: GapForm;
  readonly change: (next: (now: GapForm) => GapForm) => void;
  readonly onClose: () => void;
}

const OFFERED: readonly GasName[] = GAS_NAMES.filter((gas) => gas !== 'H2O');

/** Every gas can be asked about; the ones without a good law are refused in words, not left out. */
export function GasDialog({ form, change, onClose }: Props) {
  return (
    <Dialog title="Gas in the gap" onClose={onClose} closeLabel="Done">
      {[OFFERED.slice(0, 5), OFFERED.slice(5)].map((gases) => (
        <Choice<GasName>
          key={gases[0]}
          label={`Gas, ${gases.join(', ')}`}
          options={gases.map((gas) => ({ value: gas, label: gas }))}
          value={form.gas}
          onChange={(gas) => change((now) => ({ ...now, gas, known: { ...now.known, gas: 'what-if' } }))}
        />
      ))}
      <p className="muted">Mixtures have no law that we trust. Does UV reach the electrodes?</p>
      <Choice<'uv' | 'no-uv'>
        label="UV on the gap"
        options={[
          { value: 'uv', label: 'UV on the gap' },
          { value: 'no-uv', label: 'no UV' },
        ]}
        value={form.irradiated ? 'uv' : 'no-uv'}
        onChange={(uv) =>
          change((now) => ({
            ...now,
            irradiated: uv === 'uv',
            known: { ...now.known, irradiated: 'what-if' },
          }))
        }
      />
    </Dialog>
  );
}
