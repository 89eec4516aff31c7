import { useState } from 'react';
import { Caution } from '../../components/caution';
import { FieldRow } from '../../components/field-row';
import type { CapacitorSpec, RigSpec } from '../../domain/book/rig-spec';
import type { DerivedRow } from '../../domain/report/derived-rows';

interface DerivedRowsProps {
  readonly rows: readonly DerivedRow[];
  readonly label: string;
  /** For the narrow column: short labels, and cautions behind the touch as well. They stand in full in the figure. */
  readonly spec?: RigSpec;
}

/** Derived figures: a touch opens what each is worth. Cautions stand in full without one. */
export function DerivedRows({ rows, label, spec }: DerivedRowsProps) {
  const [open, setOpen] = useState<string | null>(null);
  return (
    <section className="derived-rows" aria-label={label}>
      {rows.map((row) => (
        <div key={row.key} className="derived-row">
          <FieldRow
            {...(spec === undefined ? { label: row.label, source: row.band ?? '' } : shortWords(row, spec))}
            value={row.value}
            unit={row.unit}
            onPress={() => setOpen(open === row.key ? null : row.key)}
          />
          {row.refusal === null ? null : <p className="derived-words muted m-0">{row.refusal}</p>}
          {spec === undefined && row.caution && row.words !== '' ? <Caution>{row.words}</Caution> : null}
          {open === row.key && row.refusal === null ? <Worth row={row} said={spec === undefined} /> : null}
        </div>
      ))}
    </section>
  );
}

function Worth({ row, said }: { readonly row: DerivedRow; readonly said: boolean }) {
  return (
    <div className="derived-words">
      {row.words === '' || (said && row.caution) ? null : row.caution ? (
        <Caution>{row.words}</Caution>
      ) : (
        <p className="m-0">{row.words}</p>
      )}
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

/** An energy never stands without its supply, and a stress never without its limit. */
function shortWords(row: DerivedRow, spec: RigSpec): { readonly label: string; readonly source: string } {
  const { supply_kV, supply_mA } = spec.charging;
  switch (row.key) {
    case 'stored':
      return { label: 'Stored', source: `${supply_kV}\u2009kV, ${supply_mA}\u2009mA` };
    case 'stress_first':
      return { label: 'Stress', source: limitWords(spec.first) };
    case 'stress_second':
      return { label: 'Stress', source: limitWords(spec.second) };
    case 'margin_first':
    case 'margin_second':
      return { label: 'Margin', source: 'limit over stress' };
    case 'channel_static':
      return { label: 'Static break', source: row.band ?? '' };
    case 'rise':
      return { label: 'Voltage rise', source: row.band ?? '' };
    case 'current_rise':
      return { label: 'Current rise', source: row.band ?? '' };
    case 'gap_current':
      return { label: 'Gap current', source: row.band ?? '' };
    case 'eyewear':
      return { label: 'Eyewear', source: 'density at least' };
    case 'rate':
      return { label: 'Rate', source: 'at most' };
    case 'reach':
      return { label: 'Reach', source: 'past ballast' };
    default:
      return { label: row.label, source: row.band ?? '' };
  }
}

function limitWords(capacitor: CapacitorSpec): string {
  return `limit ${capacitor.kind === 'sheet' ? capacitor.strength_kV_mm : capacitor.rated_kV}`;
}
