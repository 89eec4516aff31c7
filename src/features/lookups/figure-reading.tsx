import { Reading, type ReadingProps } from '../../components/reading';
import { bandText, figureText } from '../../domain/lookup/figure-text';
import type { Figure } from '../../domain/lookup/lookup';

/** A figure with its unit; very small and very large ones as a power of ten. */
export function FigureReading({
  figure,
  size,
}: {
  readonly figure: Figure;
  readonly size: NonNullable<ReadingProps['size']>;
}) {
  if (figure.words !== undefined) return <b className="lookup-words">{figure.words}</b>;
  const { figure: digits, power } = figureText(figure);
  return (
    <Reading
      value={
        power === null ? (
          digits
        ) : (
          <>
            {digits}
            <span className="reading-unit">
              {'\u2009×\u200910'}
              <sup>{String(power).replace('-', '\u2212')}</sup>
            </span>
          </>
        )
      }
      unit={figure.unit}
      size={size}
    />
  );
}

/** Figures that are wider than this, their smaller unit counted, leave the place of a large one. */
const LARGE_LETTERS = 6.5;
const UNIT_SHARE = 0.5;

/** The large figures of an answer. */
export function LargeFigure({ figure }: { readonly figure: Figure }) {
  const { figure: digits, power } = figureText(figure);
  const letters = digits.length + UNIT_SHARE * figure.unit.length;
  const size = letters > LARGE_LETTERS || power !== null ? 'pin' : 'answer';
  return (
    <div className="lookup-large" role="group" aria-label={figure.label}>
      <span className="lookup-large-label">{figure.label}</span>
      <FigureReading figure={figure} size={size} />
      <FigureBeside figure={figure} />
    </div>
  );
}

/** A figure of the list: its words left, its reading right. */
export function ListedFigure({ figure }: { readonly figure: Figure }) {
  return (
    <div className="lookup-listed" role="group" aria-label={figure.label}>
      <span className={figure.weight === 'side' ? 'muted' : ''}>{figure.label}</span>
      <FigureReading figure={figure} size={figure.weight === 'side' ? 'body' : 'lead'} />
      <FigureBeside figure={figure} />
    </div>
  );
}

function FigureBeside({ figure }: { readonly figure: Figure }) {
  const band = figure.words === undefined ? bandText(figure) : null;
  if (band === null && figure.note === undefined) return null;
  const unit = figure.unit === '' ? '' : `\u2009${figure.unit}`;
  return (
    <span className="lookup-beside muted">
      {band === null ? null : (
        <span className="nowrap">
          {band}
          {unit}
        </span>
      )}
      {band !== null && figure.note !== undefined ? '; ' : ''}
      {figure.note}
    </span>
  );
}
