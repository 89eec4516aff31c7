import { Link } from 'react-router-dom';
import { TwoFaces } from '../../components/two-faces';
import { paths } from '../../config/paths';
import type { RigDoc, RigRevision } from '../../domain/book/documents/rig';
import type { LabSettings } from '../../domain/book/rig-spec';
import { energyText } from '../../domain/capacitor/energy-text';
import { breakText } from '../../domain/rules/break-text';
import { selfBreak } from '../../domain/gap/self-break';
import { storedAt_J } from '../../domain/rules/rig-figures';
import { gapInputOf } from '../../domain/rules/rig-gap';
import { formatFigure } from '../../domain/units/format-quantity';

interface AtWorkingPoint {
  readonly revision: RigRevision;
  readonly settings: LabSettings;
}

/** The gap halfway between the pressures that the rig allows. */
export function GapPin({ rig, revision, settings }: AtWorkingPoint & { readonly rig: RigDoc }) {
  const { pressure_bar_g, answer } = atWorkingPoint(revision, settings);
  const at = `${formatFigure(pressure_bar_g, { digits: { decimals: 2 }, rounding: 'nearest' })} bar(g)`;
  return (
    <Link className="bench-pin" to={paths.gapLookup(rig.id)}>
      <span className="muted">Gap at {at}: breaks between</span>
      {answer.ok ? (
        <TwoFaces
          label={`Gap at ${at}`}
          low={breakText(answer.value.low_kV, 'down')}
          middle={breakText(answer.value.law_kV, 'nearest')}
          high={breakText(answer.value.high_kV, 'up')}
          unit="kV"
        />
      ) : (
        <span>{answer.refusal.words}</span>
      )}
    </Link>
  );
}

/** What it stores where it usually works, beside what it can store. */
export function WorkingEnergy({ revision, settings }: AtWorkingPoint) {
  const { answer } = atWorkingPoint(revision, settings);
  if (!answer.ok) return null;
  const stored = storedAt_J(revision.spec, answer.value.law_kV);
  if (!stored.ok) return null;
  return (
    <span className="muted nowrap">
      {energyText(stored.value)} J at {breakText(answer.value.law_kV, 'nearest')} kV
    </span>
  );
}

function atWorkingPoint({ spec }: RigRevision, settings: LabSettings) {
  const pressure_bar_g = (spec.gap.lowest_bar_g + spec.gap.highest_bar_g) / 2;
  const { ambient_bar_abs, ambient_C } = settings;
  const answer = selfBreak(gapInputOf(spec, { pressure_bar_g, ambient_bar_abs, temperature_C: ambient_C }));
  return { pressure_bar_g, answer };
}
