import { SaysBlock } from '../../components/says-block';
import { SigmaScale } from '../../components/sigma-scale';
import type { Plausibility } from '../../domain/calibration/plausibility';
import type { Result } from '../../domain/units/result';
import { formatFigure } from '../../domain/units/format-quantity';

interface FitSaysProps {
  readonly no: number;
  readonly fit: Result<Plausibility>;
}

/** More causes than these nobody walks through beside a rig. */
const MOST_CAUSES = 3;

/** How the reading compares, as a sentence, with what would explain it when it does not fit: the likeliest first. */
export function FitSays({ no, fit }: FitSaysProps) {
  if (!fit.ok) {
    return (
      <SaysBlock lead={`Reading ${no} cannot be compared.`}>
        <span className="muted">{fit.refusal.words}</span>
      </SaysBlock>
    );
  }
  const { sigma, words, causes, against } = fit.value;
  const what = against === 'own' ? 'its own curve' : 'the law';
  const [lead = '', rest] = words.split(/(?<=:) /);
  const named = `Reading ${no} ${lead.charAt(0).toLowerCase()}${lead.slice(1)}`;
  return (
    <div className="firing-fit" aria-label={`Reading ${no} against the law`} role="group">
      {sigma === null ? null : <SigmaScale sigma={sigma} label={sigmaWords(sigma, what)} />}
      <div>
        {rest === undefined ? (
          <SaysBlock lead={`Reading ${no}:`}>{words}</SaysBlock>
        ) : (
          <SaysBlock lead={named}>{rest}</SaysBlock>
        )}
        {causes.length === 0 && sigma !== null ? (
          <SaysBlock muted>Speaks at 3 σ, or at two of three past 2 σ.</SaysBlock>
        ) : null}
      </div>
      {causes.length === 0 ? null : (
        <ol className="firing-causes" aria-label="What would explain it, likeliest first">
          {causes.slice(0, MOST_CAUSES).map((cause, i) => (
            <li key={cause.words}>
              <b>{i + 1}</b> {cause.words}
            </li>
          ))}
        </ol>
      )}
    </div>
  );
}

function sigmaWords(sigma: number, what: string): string {
  const size = formatFigure(Math.abs(sigma), { digits: { decimals: 1 }, rounding: 'nearest' });
  return `${size} σ ${sigma < 0 ? 'below' : 'above'} ${what}`;
}
