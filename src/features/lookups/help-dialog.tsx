import { Dialog } from '../../components/dialog';
import type { Field } from '../../domain/lookup/lookup';

export function HelpDialog({ field, onClose }: { readonly field: Field; readonly onClose: () => void }) {
  return (
    <Dialog title={field.label} onClose={onClose} closeLabel="Done">
      <p>{field.help}</p>
      {field.kind === 'number' ? <p className="muted">{rangeWords(field)}</p> : null}
    </Dialog>
  );
}

function rangeWords(field: Extract<Field, { kind: 'number' }>): string {
  const unit = field.unit === '' ? '' : `\u2009${field.unit}`;
  const from = field.minExcluded === true ? 'above' : 'from';
  return `Taken ${from} ${sign(field.min)} to ${sign(field.max)}${unit}.`;
}

function sign(value: number): string {
  return String(value).replace('-', '\u2212');
}
