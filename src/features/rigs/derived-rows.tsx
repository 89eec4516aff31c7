import { useState } from 'react';
import { Caution } from '../../components/caution';
import { FieldRow } from '../../components/field-row';
import type { DerivedRow } from './derived-view';

/** Derived figures: a touch opens what each is worth. Cautions stand in full without one. */
export function DerivedRows({
  rows,
  label,
}: {
  readonly rows: readonly DerivedRow[];
  readonly label: string;
}) {
  const [open, setOpen] = useState<string | null>(null);
  return (
    <section className="derived-rows" aria-label={label}>
      {rows.map((row) => (
        <div key={row.key} className="derived-row">
          <FieldRow
            label={row.label}
            source={row.band === null ? '' : row.band}
            value={row.value}
            unit={row.unit}
            onPress={() => setOpen(open === row.key ? null : row.key)}
          />
          {row.refusal === null ? null : <p className="derived-words muted m-0">{row.refusal}</p>}
          {row.caution && row.words !== '' ? <Caution>{row.words}</Caution> : null}
          {open === row.key && row.refusal === null ? <Worth row={row} /> : null}
        </div>
      ))}
    </section>
  );
}

function Worth({ row }: { readonly row: DerivedRow }) {
  return (
    <div className="derived-words">
      {row.caution || row.words === '' ? null : <p className="m-0">{row.words}</p>}
      <p className="muted m-0">
        {row.model}. Valid: {row.valid}.
        {row.band === null ? ' By definition, without a band.' : ` Band ${row.band} ${row.unit}.`}
      </p>
      {row.warnings.map((words) => (
        <Caution key={words}>{words}</Caution>
      ))}
    </div>
  );
}
