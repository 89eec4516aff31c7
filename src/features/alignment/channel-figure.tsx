import { useRef } from 'react';
import { useSize } from '../../components/use-size';
import { lineAt } from '../../domain/alignment/gap-line';
import { eighthsWords } from '../../domain/report/kit-words';
import { formatQuantity } from '../../domain/units/format-quantity';
import { arcParts, tapArc, type ArcPlace } from './alignment-form';
import { measuredGap, type Gaps } from './alignment-plan';
import type { AlignmentSetting } from './alignment-setting';
import { drawingPlan, timesWords, type DrawingPlan } from './drawing-plan';

interface Props {
  readonly setting: AlignmentSetting;
  readonly gaps: Gaps | null;
  readonly target_mm: number;
  readonly after: Gaps | null;
  readonly turns: readonly [number, number] | null;
  readonly arcs: ArcPlace | null;
  readonly onArcs: (arcs: ArcPlace | null) => void;
}

const PARTS = [
  { key: 'a', label: 'A end' },
  { key: 'mid', label: 'mid' },
  { key: 'b', label: 'B end' },
] as const;

/** Both bars seen from the side: lengths to scale, gaps larger; each third of the channel is a target for arcs. */
export function ChannelFigure(props: Props) {
  const { setting, gaps, target_mm, arcs, onArcs } = props;
  const ref = useRef<HTMLDivElement>(null);
  const box = useSize(ref);
  const drawn = gaps ?? { a_mm: target_mm, b_mm: target_mm };
  const plan = drawingPlan(setting, { gaps: drawn, target_mm, box });
  const [from, to] = [plan.x(0), plan.x(setting.length_mm)];
  const seen = arcParts(arcs);
  return (
    <div>
      <div ref={ref} className="align-drawing" role="group" aria-label="Where arcs sit">
        {box.width === 0 ? null : (
          <svg aria-hidden="true">
            <Bars plan={plan} drawn={drawn} {...props} />
            <GapLabels plan={plan} drawn={drawn} {...props} />
            {seen.map((part) => (
              <path
                key={part}
                className="channel-arc"
                d={arcLine(
                  from + ((to - from) * (PARTS.findIndex(({ key }) => key === part) + 0.5)) / 3,
                  plan,
                )}
              />
            ))}
          </svg>
        )}
        <div className="align-parts" style={{ left: from, width: Math.max(0, to - from) }}>
          {PARTS.map(({ key, label }) => (
            <button
              key={key}
              type="button"
              aria-pressed={seen.includes(key)}
              onClick={() => onArcs(tapArc(arcs, key))}
            >
              <span>{label}</span>
            </button>
          ))}
        </div>
      </div>
      <p className="muted align-scale">
        Gaps drawn {timesWords(plan.times)} times larger than lengths.
        {gaps === null ? ' Nothing measured yet: drawn at the target.' : ''} Tap where arcs sit.
      </p>
    </div>
  );
}

interface Drawn extends Props {
  readonly plan: DrawingPlan;
  readonly drawn: Gaps;
}

function Bars({ plan, drawn, setting, gaps, target_mm, after, turns }: Drawn) {
  const [from, to] = [plan.x(0), plan.x(setting.length_mm)];
  const face = (now: Gaps): string => {
    const line = measuredGap(now, setting);
    return `M${from} ${plan.face(lineAt(line, 0))}L${to} ${plan.face(lineAt(line, setting.length_mm))}`;
  };
  const line = measuredGap(drawn, setting);
  const top = (place: number): number => plan.face(lineAt(line, place)) - plan.bar;
  return (
    <>
      <rect className="align-bar" x={from} y={plan.floor} width={to - from} height={plan.bar} />
      <path
        className={gaps === null ? 'align-bar unknown' : 'align-bar'}
        d={`${face(drawn)}L${to} ${top(setting.length_mm)}L${from} ${top(0)}Z`}
      />
      {gaps === null ? null : (
        <path className="align-face" d={`M${from} ${plan.floor}H${to}${face(drawn)}`} />
      )}
      <path className="align-target" d={face({ a_mm: target_mm, b_mm: target_mm })} />
      {after === null ? null : <path className="align-after" d={face(after)} />}
      {(setting.screws ?? []).map((screw, at) => {
        const x = plan.x(screw.position_mm);
        const y = top(screw.position_mm);
        const eighths = turns?.[at] ?? 0;
        const anchor = at === 0 ? 'start' : 'end';
        return (
          <g key={screw.name} className="align-screw">
            <path
              d={`M${x} ${y - 26}V${y}M${x - 8} ${y - 26}H${x + 8}M${x - 5} ${y - 17}H${x + 5}M${x - 5} ${y - 9}H${x + 5}`}
            />
            <text x={at === 0 ? x + 14 : x - 14} y={y - 12} textAnchor={anchor}>
              {screw.name}
              {eighths === 0
                ? ''
                : `: ${eighthsWords(Math.abs(eighths))} ${eighths > 0 ? 'clockwise' : 'anticlockwise'}`}
            </text>
          </g>
        );
      })}
    </>
  );
}

function GapLabels({ plan, drawn, setting, gaps }: Drawn) {
  const ends = [
    { place: setting.place_a_mm, gap: drawn.a_mm, anchor: 'start', end: 'A' },
    { place: setting.place_b_mm, gap: drawn.b_mm, anchor: 'end', end: 'B' },
  ] as const;
  return (
    <>
      {ends.map(({ place, gap, anchor, end }) => {
        const x = plan.x(place);
        const away = anchor === 'start' ? 10 : -10;
        return (
          <g key={end} className="align-gap">
            <path
              d={`M${x} ${plan.floor}V${plan.face(gap)}M${x - 7} ${plan.floor}h14M${x - 7} ${plan.face(gap)}h14`}
            />
            {gaps === null ? null : (
              <text
                x={x + away}
                y={(plan.floor + plan.face(gap)) / 2}
                textAnchor={anchor}
                dominantBaseline="central"
              >
                {formatQuantity(gap, 'mm', { digits: { decimals: 2 }, rounding: 'nearest' })}
              </text>
            )}
          </g>
        );
      })}
    </>
  );
}

/** Sideways offsets of an arc on its way down; drawn, not random, so that a screen looks the same each time. */
const ARC = [0, 7, -5, 9, -8, 4, 0] as const;

function arcLine(x: number, plan: DrawingPlan): string {
  const top = plan.floor - (plan.floor - plan.bar) * 0.62;
  return ARC.map(
    (dx, i) => `${i === 0 ? 'M' : 'L'}${x + dx} ${top + ((plan.floor - top) * i) / (ARC.length - 1)}`,
  ).join('');
}
