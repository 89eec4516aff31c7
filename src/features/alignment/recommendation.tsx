import { Link } from 'react-router-dom';
import { Reading } from '../../components/reading';
import { SaysBlock } from '../../components/says-block';
import { paths } from '../../config/paths';
import type { ScrewSpec } from '../../domain/book/rig-spec';
import type { Answer } from '../../domain/units/answer';
import { eighthsWords } from '../../domain/report/kit-words';
import { formatFigure, formatQuantity } from '../../domain/units/format-quantity';
import { gapsAfter, spread_pct, type Gaps } from './alignment-plan';
import { screwTravel_mm } from './alignment-setting';
import type { AlignmentScreen } from './use-alignment-screen';

/** Which screw, which way, how far, and what that gives. */
export function Recommendation({ screen }: { readonly screen: AlignmentScreen }) {
  const { setting, advised, plan, advice, rig, last } = screen;
  if (setting.missing !== null || setting.screws === null) {
    return (
      <SaysBlock lead="No recommendation.">
        {setting.missing} Gaps and arcs can be logged all the same.{' '}
        <Link to={paths.reviseRig(rig.id)}>Enter the screws in the rig’s numbers</Link>
      </SaysBlock>
    );
  }
  if (advised === null) {
    return (
      <SaysBlock lead="Measure both ends.">
        {last === null
          ? 'Then Holdoff says which screw, which way and how far.'
          : 'A screw was turned since the last measurement.'}
      </SaysBlock>
    );
  }
  if (plan === undefined || !plan.ok || advice === null) {
    return <SaysBlock lead="No recommendation.">{plan?.ok === false ? plan.refusal.words : ''}</SaysBlock>;
  }
  const [first, second] = setting.screws;
  return (
    <div className="align-plan">
      <ScrewTurns screw={first} eighths={advice[0]} />
      <ScrewTurns screw={second} eighths={advice[1]} />
      <Predicted screen={screen} gaps={advised} ends={plan.value.ends} advice={advice} />
      {plan.value.warnings.map((warning) => (
        <p key={warning.type}>{warning.words}</p>
      ))}
    </div>
  );
}

function ScrewTurns({ screw, eighths }: { readonly screw: ScrewSpec; readonly eighths: number }) {
  const travel_mm = screwTravel_mm(screw, eighths);
  const way = eighths > 0 ? 'clockwise' : 'anticlockwise';
  return (
    <div className="align-turn">
      <span>{screw.name}</span>
      {eighths === 0 ? (
        <Reading value="leave" />
      ) : (
        <Reading value={eighthsWords(Math.abs(eighths))} unit={`turn ${way}`} />
      )}
      <span className="muted">
        {eighths === 0
          ? 'within an eighth'
          : `${travel_mm > 0 ? 'opens' : 'closes'} by ${mm(Math.abs(travel_mm))}`}
      </span>
    </div>
  );
}

interface PredictedProps {
  readonly screen: AlignmentScreen;
  readonly gaps: Gaps;
  readonly ends: { readonly left: Answer; readonly right: Answer };
  readonly advice: readonly [number, number];
}

function Predicted({ screen, gaps, ends, advice }: PredictedProps) {
  const after = gapsAfter(gaps, screen.setting, advice);
  const now = spread_pct(gaps, screen.ambient_bar_abs);
  const then = after === null ? null : spread_pct(after, screen.ambient_bar_abs);
  return (
    <p>
      {screen.typed === null ? '' : 'Not logged yet. '}Then A {endWords(ends.left)}, B {endWords(ends.right)}.
      {now === null || then === null ? null : (
        <span className="muted">
          {' '}
          The ends break within {pct(then)} of each other, now {pct(now)}; even to the eye is about{' '}
          {'2\u2009%'}.
        </span>
      )}
    </p>
  );
}

function endWords(end: Answer): string {
  const low = formatFigure(end.band.low, { digits: { decimals: 2 }, rounding: 'down' });
  const high = formatFigure(end.band.high, { digits: { decimals: 2 }, rounding: 'up' });
  return `${mm(end.value)} (${low} to ${high})`;
}

function mm(value_mm: number): string {
  return formatQuantity(value_mm, 'mm', { digits: { decimals: 2 }, rounding: 'nearest' });
}

/** Leans up: nobody shall think it more even than it is. */
function pct(value: number): string {
  return formatQuantity(Math.abs(value), '%', { digits: { decimals: 1 }, rounding: 'up' });
}
