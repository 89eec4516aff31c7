import { useRef } from 'react';
import { useSize } from '../../../components/use-size';
import { FOIL_PX, PLY_PX, sheetPlan, sheetWords, type Sheet } from './sheet-plan';

interface Props {
  readonly name: string;
  readonly sheet: Sheet;
  readonly supply_kV: number | null;
}

const LEFT_PX = 96;
const RIGHT_PX = 128;
/** Half the free edge: foils of the two poles end before each other. */
const SETBACK_PX = 34;

/** Through the sheet: plies thicken the film between two foils, pairs multiply the foils. */
export function SheetDrawing({ name, sheet, supply_kV }: Props) {
  const box = useRef<HTMLDivElement>(null);
  const { width } = useSize(box);
  const plan = sheetPlan(sheet.plies, sheet.plate_pairs);
  const words = sheetWords(sheet, supply_kV);
  const right = Math.max(LEFT_PX + 80, width - RIGHT_PX);
  const [first] = plan.pairs;
  return (
    <section className="sheet-drawing" aria-label={`Cross-section of ${name}`}>
      <div ref={box}>
        <svg width="100%" height={plan.height} role="img" aria-label={`${words.foils}. ${words.thickness}.`}>
          {plan.pairs.flatMap((pair) =>
            pair.plies.map((y) => (
              <rect
                key={y}
                className="sheet-ply"
                x={LEFT_PX}
                y={y + 1}
                width={right - LEFT_PX}
                height={PLY_PX - 2}
              />
            )),
          )}
          {plan.foils.map(({ y, side }) => (
            <rect
              key={y}
              className="sheet-foil"
              x={side === 'left' ? LEFT_PX - SETBACK_PX : LEFT_PX + SETBACK_PX}
              y={y}
              width={right - LEFT_PX}
              height={FOIL_PX}
            />
          ))}
          {first === undefined ? null : (
            <text className="sheet-words" x={width} textAnchor="end" y={(first.top + first.bottom) / 2 + 7}>
              {sheet.plies === 1 ? '1 ply' : `${sheet.plies} plies`}
            </text>
          )}
          {plan.pairs.map((pair, i) => (
            <text key={pair.top} className="sheet-words" x={0} y={(pair.top + pair.bottom) / 2 + 7}>
              pair {i + 1}
            </text>
          ))}
        </svg>
      </div>
      <p className="m-0">
        {words.thickness}. {words.foils}. <b className="nowrap">{words.capacitance}</b>.
        {plan.more_pairs > 0 ? ` ${plan.more_pairs} more pairs are not drawn.` : ''}
        {first !== undefined && first.more > 0
          ? ` ${first.more} more plies between two foils are not drawn.`
          : ''}
      </p>
      <p className="muted m-0">
        One ply more: <span className="nowrap">{words.one_ply_more}</span>. One pair more:{' '}
        <span className="nowrap">{words.one_pair_more}</span>.
      </p>
    </section>
  );
}
