import { Reading } from '../../components/reading';
import { dayWords } from '../../domain/report/time-words';
import { formatFigure } from '../../domain/units/format-quantity';
import { burstLine, type BurstView } from './burst';
import { shownQuantity } from './reading-fields';
import { isCarried } from './reading-form';
import type { FiringFacts } from './use-firing-facts';
import type { Said } from './use-firing-log';
import type { ReadingForm } from './use-reading-form';

interface FiringHeadProps {
  readonly facts: FiringFacts;
  readonly form: ReadingForm;
  readonly said: Said | null;
  readonly burst: BurstView;
}

/** Shots so far, and the burst, the rate and the permit that the next reading stands on, always in view. */
export function FiringHead({ facts, form, said, burst }: FiringHeadProps) {
  return (
    <div className="firing-head">
      <ShotsTotal shots={facts.firing.shots} />
      <div className="firing-head-words">
        <p>{burstLine(burst) ?? burstWords(form)}</p>
        <p className="muted">
          {[rateSource(form), permitWords(facts)].filter((word) => word !== '').join('; ')}
        </p>
        <p role="status">
          {said === null ? <span className="muted">{limitWords(facts)}</span> : <SaidWords said={said} />}
        </p>
      </div>
    </div>
  );
}

export function ShotsTotal({ shots }: { readonly shots: number }) {
  return (
    <Reading
      value={formatFigure(shots, { digits: { decimals: 0 }, rounding: 'nearest' })}
      unit={shots === 1 ? 'shot' : 'shots'}
      size="answer"
    />
  );
}

function SaidWords({ said }: { readonly said: Said }) {
  return (
    <>
      <b>{said.lead}</b> {said.words}
    </>
  );
}

function burstWords({ values }: ReadingForm): string {
  const { shots, rate_Hz } = values;
  if (shots === null) return 'No burst counted yet';
  const rate = rate_Hz === null ? '' : ` at ${shownQuantity(rate_Hz, 'rate_Hz') ?? ''}\u2009Hz`;
  return `burst ${shownQuantity(shots, 'shots') ?? ''}${rate}`;
}

function rateSource({ values, draft }: ReadingForm): string {
  if (values.rate_Hz === null) return '';
  return isCarried(draft, 'rate_Hz') ? 'rate carried over' : 'rate entered';
}

export function permitWords({ firing, envelope, zone }: FiringFacts): string {
  const { permit } = envelope;
  if (permit === null) return firing.unready === null ? 'no permit' : 'recorded as unready, no permit';
  return permit.withdrawn === null ? `permit to ${dayWords(permit.until_ms, zone)}` : 'permit withdrawn';
}

/** What the readings are held against. */
export function limitWords({ envelope }: FiringFacts): string {
  const { max_kV, max_bar_g, max_rate_Hz, permit } = envelope;
  const limits = `${max_kV}\u2009kV, ${max_bar_g}\u2009bar(g), ${max_rate_Hz}\u2009Hz`;
  return permit === null ? `rig’s limits ${limits}` : `at most ${limits}`;
}
