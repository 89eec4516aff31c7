import { useRef } from 'react';
import { electrodePath } from '../../components/electrode';
import { useSize } from '../../components/use-size';
import type { RigSpec } from '../../domain/book/rig-spec';
import { CAPACITOR_WORDS, TOPOLOGY_WORDS } from '../../domain/report/words';
import { circuitPlan, type CircuitPlan, type Electrodes, type Plates } from './circuit-plan';
import type { RigView } from './figures-view';

interface Props {
  readonly name: string;
  readonly spec: RigSpec;
  readonly view: RigView;
}

/** The circuit as the Book knows it: every part that holds off, stores or bleeds, and a ring on each charged node. */
export function RigCircuit({ name, spec, view }: Props) {
  const box = useRef<HTMLDivElement>(null);
  const { width } = useSize(box);
  const plan = circuitPlan(spec.topology, width);
  const rings = spec.nodes.slice(0, plan.rings.length);
  return (
    <div ref={box} className="rig-circuit">
      <svg
        viewBox={`0 0 ${plan.width} ${plan.height}`}
        role="img"
        aria-label={`Circuit of ${name}, ${TOPOLOGY_WORDS[spec.topology]}: ${rings.map((node, i) => `ring ${i + 1} on ${node.name}`).join(', ')}`}
        style={{ fontSize: plan.font }}
      >
        <Conductors plan={plan} />
        <Symbols plan={plan} acrossKnown={spec.channel.across_kohm !== null} />
        {rings.map((node, i) => (
          <Ring key={node.name} plan={plan} at={i} />
        ))}
        {plan.lettered ? <Letters plan={plan} spec={spec} view={view} /> : null}
      </svg>
    </div>
  );
}

function Conductors({ plan }: { readonly plan: CircuitPlan }) {
  const { rail, ground, supply_x, ballast, bleed_x, gap, channel, first, second } = plan;
  const middle = (rail + ground) / 2;
  const half = 42 * scaleOf(plan);
  const last = plan.second_bleed_x ?? (channel.upright ? channel.x + acrossAside(plan) : second.x);
  const plates = ({ x }: Plates): string => `M${x} ${rail}V${middle - 24}M${x} ${middle + 24}V${ground}`;
  const breaks = [gap, channel]
    .filter((one) => !one.upright)
    .map((one) => ({ from: one.x - one.long - one.apart / 2, to: one.x + one.long + one.apart / 2 }))
    .toSorted((a, b) => a.from - b.from);
  let railPath = `M${supply_x} ${middle - half}V${rail}H${ballast.from}M${ballast.to} ${rail}`;
  for (const { from, to } of breaks) railPath += `H${from}M${to} ${rail}`;
  railPath += `H${last}`;
  const upright = [gap, channel].find((one) => one.upright);
  const stems =
    upright === undefined
      ? ''
      : `M${upright.x} ${rail}V${upright.y - upright.long - upright.apart / 2}M${upright.x} ${upright.y + upright.long + upright.apart / 2}V${ground}`;
  const across = acrossPath(plan);
  const bleeds = [bleed_x, plan.second_bleed_x]
    .flatMap((x) => (x === null ? [] : [`M${x} ${rail}V${ground}`]))
    .join('');
  return (
    <path
      className="circuit-wire"
      d={`${railPath}M${supply_x} ${middle + half}V${ground}H${last}${bleeds}${stems}${plates(first)}${plates(second)}${across}`}
    />
  );
}

/** The resistor across the channel: over it where the channel lies in the rail, beside it where it stands. */
function acrossPath(plan: CircuitPlan): string {
  const { channel, rail, ground } = plan;
  if (channel.upright) {
    const x = channel.x + acrossAside(plan);
    return `M${x} ${rail}V${ground}`;
  }
  const reach = channel.long + channel.apart / 2 + 10 * scaleOf(plan);
  const y = rail - acrossAside(plan) * 0.7;
  return `M${channel.x - reach} ${rail}V${y}H${channel.x + reach}V${rail}`;
}

function acrossAside(plan: CircuitPlan): number {
  return plan.lettered ? 76 : 36;
}

function scaleOf(plan: CircuitPlan): number {
  return plan.lettered ? 1 : 0.5;
}

function Symbols({ plan, acrossKnown }: { readonly plan: CircuitPlan; readonly acrossKnown: boolean }) {
  const { rail, ground, supply_x, ballast, bleed_x, channel } = plan;
  const k = scaleOf(plan);
  const middle = (rail + ground) / 2;
  const lying = (x: number, y: number, long: number) => (
    <rect className="circuit-box" x={x - long / 2} y={y - 12 * k} width={long} height={24 * k} />
  );
  const standing = (x: number) => (
    <rect className="circuit-box" x={x - 12 * k} y={middle - 44 * k} width={24 * k} height={88 * k} />
  );
  return (
    <>
      <rect
        className="circuit-box"
        x={supply_x - 42 * k}
        y={middle - 42 * k}
        width={84 * k}
        height={84 * k}
      />
      {lying((ballast.from + ballast.to) / 2, rail, ballast.to - ballast.from)}
      {standing(bleed_x)}
      {plan.second_bleed_x === null ? null : standing(plan.second_bleed_x)}
      {acrossKnown
        ? channel.upright
          ? standing(channel.x + acrossAside(plan))
          : lying(channel.x, rail - acrossAside(plan) * 0.7, 80 * k)
        : null}
      <path className="circuit-metal" d={facesOf(plan.gap) + facesOf(channel)} />
      <PlatesOf plates={plan.first} plan={plan} />
      <PlatesOf plates={plan.second} plan={plan} />
    </>
  );
}

function facesOf({ upright, x, y, thick, long, apart }: Electrodes): string {
  const shape = { edge: thick / 8, sagitta: thick / 9 };
  if (upright) {
    const box = { ...shape, x: x - thick / 2, width: thick, height: long };
    return (
      electrodePath({ ...box, y: y - apart / 2 - long, facing: 'down' }) +
      electrodePath({ ...box, y: y + apart / 2, facing: 'up' })
    );
  }
  const box = { ...shape, y: y - thick / 2, width: long, height: thick };
  return (
    electrodePath({ ...box, x: x - apart / 2 - long, facing: 'right' }) +
    electrodePath({ ...box, x: x + apart / 2, facing: 'left' })
  );
}

function PlatesOf({ plates, plan }: { readonly plates: Plates; readonly plan: CircuitPlan }) {
  const middle = (plan.rail + plan.ground) / 2;
  const left = plates.x - plates.width / 2;
  return (
    <>
      <path
        className="circuit-plates"
        d={`M${left} ${middle - 24}h${plates.width}M${left} ${middle + 24}h${plates.width}`}
      />
      <path
        className="circuit-plies"
        d={[-10, 0, 10].map((by) => `M${left} ${middle + by}h${plates.width}`).join('')}
      />
    </>
  );
}

function Ring({ plan, at }: { readonly plan: CircuitPlan; readonly at: number }) {
  const place = plan.rings[at];
  if (place === undefined) return null;
  return (
    <g className="circuit-ring">
      <circle cx={place.x} cy={place.y} r={plan.ring_r} />
      <text x={place.x} y={place.y + plan.font * 0.36} textAnchor="middle">
        {at + 1}
      </text>
    </g>
  );
}

function Letters({ plan, spec, view }: Omit<Props, 'name'> & { readonly plan: CircuitPlan }) {
  const { rail, ground, supply_x, ballast, bleed_x, gap, channel, first, second } = plan;
  const middle = (rail + ground) / 2;
  const names = CAPACITOR_WORDS[spec.topology];
  const { supply_kV, supply_mA, ballast_Mohm } = spec.charging;
  const bleeds = (['first', 'second'] as const).map(
    (holds) => spec.nodes.find((node) => node.holds === holds)?.bleed_Mohm ?? null,
  );
  const [firstBleed, secondBleed] = bleeds.map((one) => (one === null ? '?' : String(one)));
  const gapAt = gap.upright
    ? { x: gap.x + gap.thick / 2 + 12, y: gap.y - 48, anchor: 'start' as const, line: 56 }
    : { x: gap.x, y: rail + gap.thick / 2 + 30, anchor: 'middle' as const, line: 28 };
  const channelText = `${spec.channel.length_mm} × ${spacing(spec)}\u2009mm`;
  return (
    <>
      <Lines
        x={supply_x}
        y={middle - 6}
        anchor="middle"
        lines={[`${supply_kV}\u2009kV`, `${supply_mA}\u2009mA`]}
      />
      <Lines
        x={(ballast.from + ballast.to) / 2}
        y={rail - 24}
        anchor="middle"
        lines={[`${ballast_Mohm}\u2009MΩ`]}
      />
      <Lines x={bleed_x - 20} y={middle - 6} anchor="end" lines={[firstBleed ?? '', 'MΩ']} />
      {plan.second_bleed_x === null ? null : (
        <Lines x={plan.second_bleed_x + 20} y={middle - 6} anchor="start" lines={[secondBleed ?? '', 'MΩ']} />
      )}
      <Lines
        x={gapAt.x}
        y={gapAt.y}
        anchor={gapAt.anchor}
        step={gapAt.line}
        lines={[
          `${spec.gap.gap_mm}\u2009mm`,
          view.sides.ok ? `${view.sides.value.law}\u2009kV` : 'no law',
          `${spec.gap.highest_bar_g}\u2009bar(g)`,
        ]}
        muted={2}
      />
      <Lines
        x={first.x + 8}
        y={middle + 62}
        anchor="start"
        lines={[`${view.first_nF}\u2009nF`, short(names.first)]}
        muted={1}
      />
      <Lines
        x={second.x - 8}
        y={middle + 62}
        anchor="end"
        lines={[`${view.second_nF}\u2009nF`, short(names.second)]}
        muted={1}
      />
      {channel.upright ? (
        <Lines x={channel.x} y={ground + 28} anchor="middle" lines={[channelText]} />
      ) : (
        <Lines x={channel.x} y={rail + 46} anchor="middle" lines={[channelText]} />
      )}
      {spec.channel.across_kohm === null ? null : channel.upright ? (
        <Lines
          x={channel.x + acrossAside(plan) + 20}
          y={middle - 6}
          anchor="start"
          lines={[String(spec.channel.across_kohm), 'kΩ']}
        />
      ) : (
        <Lines
          x={channel.x}
          y={rail - acrossAside(plan) * 0.7 - 18}
          anchor="middle"
          lines={[`${spec.channel.across_kohm}\u2009kΩ`]}
        />
      )}
    </>
  );
}

interface LinesProps {
  readonly x: number;
  readonly y: number;
  readonly anchor: 'start' | 'middle' | 'end';
  readonly lines: readonly string[];
  readonly step?: number;
  /** Index of the line that is set back. */
  readonly muted?: number;
}

function Lines({ x, y, anchor, lines, step = 28, muted }: LinesProps) {
  return lines.map((line, i) => (
    <text
      key={line}
      x={x}
      y={y + i * step}
      textAnchor={anchor}
      className={i === muted ? 'circuit-muted' : ''}
    >
      {line}
    </text>
  ));
}

function short(name: string): string {
  return name.replace(' capacitor', '');
}

function spacing({ channel }: RigSpec): string {
  const { spacing_a_mm, spacing_b_mm } = channel;
  return spacing_a_mm === spacing_b_mm ? String(spacing_a_mm) : `${spacing_a_mm} to ${spacing_b_mm}`;
}
