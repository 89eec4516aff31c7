import { Choice } from '../../components/choice';
import { Dialog } from '../../components/dialog';
import type { Find, GapForm } from './gap-form';
import type { GapPurpose } from '../../domain/gap/gap-solve';

interface Props {
  readonly form: GapForm;
  readonly change: (next: (now: GapForm) => GapForm) => void;
  readonly onClose: () => void;
}

/** Which quantity is wanted, and for a pressure or a gap what it is for: that decides which side it leans on. */
export function FindDialog({ form, change, onClose }: Props) {
  return (
    <Dialog title="Find" onClose={onClose} closeLabel="Done">
      <Choice<Find>
        label="Quantity"
        options={[
          { value: 'voltage', label: 'voltage' },
          { value: 'pressure', label: 'pressure' },
          { value: 'gap', label: 'gap' },
        ]}
        value={form.find}
        onChange={(find) =>
          change((now) => ({
            ...now,
            find,
            refusal: null,
            active: find === 'voltage' ? 'pressure' : 'voltage_kV',
          }))
        }
      />
      {form.find === 'voltage' ? null : (
        <>
          <p className="muted">What is it for?</p>
          <Choice<GapPurpose>
            label="Purpose"
            options={[
              { value: 'hold-off-at-least', label: 'hold off at least' },
              { value: 'break-at-most', label: 'break at most' },
            ]}
            value={form.purpose}
            onChange={(purpose) => change((now) => ({ ...now, purpose }))}
          />
        </>
      )}
    </Dialog>
  );
}
