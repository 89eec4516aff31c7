import { useRef } from 'react';
import { electrodePath } from './electrode';
import { useSize } from './use-size';

export interface ChannelPart {
  readonly key: string;
  readonly label: string;
}

export interface ChannelDrawingProps {
  readonly label: string;
  /** From one end to the other, usually three. */
  readonly parts: readonly ChannelPart[];
  /** Keys of the parts where something heavy sits. */
  readonly arcs: readonly string[];
  /** Fine lines along the whole length. */
  readonly even: boolean;
  readonly length_mm: number;
  readonly onToggle: (key: string) => void;
}

/** Two long electrodes seen from the side; each part is a target, and what was seen is drawn where it was seen. */
export function ChannelDrawing({ label, parts, arcs, even, length_mm, onToggle }: ChannelDrawingProps) {
  const ref = useRef<HTMLDivElement>(null);
  const { width, height } = useSize(ref);
  const bar = height * 0.215;
  const end = width * 0.037;
  const long = Math.max(0, width - 2 * end);
  const body = { x: end, width: long, height: bar, edge: Math.min(10, bar / 3), sagitta: 3.5 };
  const upper = electrodePath({ ...body, y: 0, facing: 'down' });
  const lower = electrodePath({ ...body, y: height - bar, facing: 'up' });
  const partWidth = long / Math.max(1, parts.length);
  const middle = (i: number): number => end + (i + 0.5) * partWidth;
  const marks = long > 500 ? [0, 0.25, 0.5, 0.75, 1] : [0, 0.5, 1];
  return (
    <div ref={ref} className="channel" role="group" aria-label={label}>
      <svg aria-hidden="true">
        <path className="channel-body" d={upper + lower} />
        {even ? (
          <path
            className="channel-even"
            d={evenLines(end + 6, end + long - 6, [bar + 3, height - bar - 3])}
          />
        ) : null}
        {parts.map((part, i) =>
          arcs.includes(part.key) ? (
            <path key={part.key} className="channel-arc" d={arcLine(middle(i), bar - 1, height - bar + 1)} />
          ) : null,
        )}
        <path
          className="channel-cut"
          d={parts
            .slice(1)
            .map(
              (_, i) =>
                `M${end + (i + 1) * partWidth} 0V${bar + 4}M${end + (i + 1) * partWidth} ${height - bar - 4}V${height}`,
            )
            .join('')}
        />
        <path className="channel-ends" d={`M${end * 0.1} 0V${height}M${width - end * 0.1} 0V${height}`} />
        {marks.map((mark) => (
          <text
            key={mark}
            x={end + 6 + mark * (long - 12)}
            y={height - bar / 2}
            dominantBaseline="central"
            textAnchor={mark === 0 ? 'start' : mark === 1 ? 'end' : 'middle'}
          >
            {mark === 1 ? `${length_mm}\u2009mm` : Math.round(mark * length_mm)}
          </text>
        ))}
      </svg>
      <div className="channel-parts" style={{ paddingInline: end }}>
        {parts.map((part) => (
          <button
            key={part.key}
            type="button"
            aria-pressed={arcs.includes(part.key)}
            onClick={() => onToggle(part.key)}
          >
            <span style={{ height: bar }}>{part.label}</span>
          </button>
        ))}
      </div>
    </div>
  );
}

function evenLines(from: number, to: number, [top, bottom]: readonly [number, number]): string {
  const count = Math.max(1, Math.round((to - from) / 10.3));
  return Array.from(
    { length: count + 1 },
    (_, i) => `M${from + ((to - from) * i) / count} ${top}V${bottom}`,
  ).join('');
}

/** Sideways offsets of an arc on its way down; drawn, not random, so that a screen looks the same each time. */
const ARC = [0, 7, -5, 9, -8, 4, 0] as const;

function arcLine(x: number, top: number, bottom: number): string {
  return ARC.map(
    (dx, i) => `${i === 0 ? 'M' : 'L'}${x + dx} ${top + ((bottom - top) * i) / (ARC.length - 1)}`,
  ).join('');
}
