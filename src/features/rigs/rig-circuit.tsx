import { useRef } from 'react';
import { useSize } from '../../components/use-size';
import type { RigSpec } from '../../domain/book/rig-spec';
import type { RigDerived } from '../../domain/rules/rig-derived';
import { CAPACITOR_WORDS, TOPOLOGY_WORDS } from '../../domain/report/words';
import { formatQuantity } from '../../domain/units/format-quantity';
import { circuitPlan, type CircuitPlan, type Plates } from './circuit-plan';
import { coilPath, facesOf, ringPlaces, type RingPlace } from './circuit-shapes';
import { derivedRows } from '../../domain/report/derived-rows';

interface Props {
  readonly name: string;
  readonly spec: RigSpec;
  readonly derived: RigDerived;
}

/** The circuit as the Book knows it: every part that holds off, stores or bleeds, and a ring on each charged node. */
export function RigCircuit({ name, spec, derived }: Props) {
  const box = useRef<HTMLDivElement>(null);
  const { width } = useSize(box);
  const plan = circuitPlan(spec.topology, width);
  const rings = ringPlaces(plan, spec.nodes);
  return (
    <div ref={box} className="rig-circuit">
      <svg
        viewBox={`0 0 ${plan.width} ${plan.height}`}
        role="img"
        aria-label={`Circuit of ${name}, ${TOPOLOGY_WORDS[spec.topology]}: ${spec.nodes.map((node, i) => `ring ${i + 1} on ${node.name}`).join(', ')}`}
        style={{ fontSize: plan.font }}
      >
        <Conductors plan={plan} spec={spec} />
        <Symbols plan={plan} spec={spec} />
        {rings.map((place, i) =>
          place === null ? null : (
            <Ring key={`${place.x} ${place.y}`} plan={plan} place={place} number={i + 1} />
          ),
        )}
        {plan.lettered ? <Letters plan={plan} spec={spec} derived={derived} /> : null}
      </svg>
    </div>
  );
}

interface DrawnProps {
  readonly plan: CircuitPlan;
  readonly spec: RigSpec;
}

/** Whether anything stands across the channel; without it there is no line either, which would be a short. */
function hasAcross({ channel, charging }: RigSpec): boolean {
  return channel.across_kohm !== null || charging.inductor_uH !== undefined;
}

function Conductors({ plan, spec }: DrawnProps) {
  const { rail, ground, supply_x, ballast, bleed_x, gap, channel, first, second } = plan;
  const middle = (rail + ground) / 2;
  const half = 42 * scaleOf(plan);
  const last =
    plan.second_bleed_x ??
    (channel.upright ? channel.x + (hasAcross(spec) ? acrossAside(plan) : 0) : second.x);
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
  const across = hasAcross(spec) ? acrossPath(plan) : '';
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

function Symbols({ plan, spec }: DrawnProps) {
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
      {spec.channel.across_kohm === null
        ? null
        : channel.upright
          ? standing(channel.x + acrossAside(plan))
          : spec.charging.inductor_uH === undefined
            ? lying(channel.x, rail - acrossAside(plan) * 0.7, 80 * k)
            : null}
      {spec.charging.inductor_uH === undefined || channel.upright ? null : (
        <>
          <path
            className="circuit-gone"
            d={`M${channel.x - 40 * k} ${rail - acrossAside(plan) * 0.7}h${80 * k}`}
          />
          <path className="circuit-coil" d={coilPath(channel.x, rail - acrossAside(plan) * 0.7, 80 * k)} />
        </>
      )}
      <path
        className="circuit-metal"
        d={facesOf(plan.gap, spec.gap.electrodes) + facesOf(channel, 'domed')}
      />
      <PlatesOf plates={plan.first} plan={plan} />
      <PlatesOf plates={plan.second} plan={plan} />
    </>
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

interface RingProps {
  readonly plan: CircuitPlan;
  readonly place: RingPlace;
  readonly number: number;
}

function Ring({ plan, place, number }: RingProps) {
  return (
    <g className="circuit-ring">
      {place.stem === 0 ? null : (
        <path className="circuit-wire" d={`M${place.x} ${place.y}v${place.stem - plan.ring_r}`} />
      )}
      <circle cx={place.x} cy={place.y} r={plan.ring_r} />
      <text x={place.x} y={place.y + plan.font * 0.36} textAnchor="middle">
        {number}
      </text>
    </g>
  );
}

function Letters({ plan, spec, derived }: DrawnProps & { readonly derived: RigDerived }) {
  const [firstRow, secondRow, breakRow] = derivedRows(derived, ['first', 'second', 'self_break']);
  const pressure = formatQuantity(derived.at.pressure_bar_g, 'bar(g)', {
    digits: { decimals: 2 },
    rounding: 'nearest',
  });
  const acrossText = acrossWords(spec);
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
          (breakRow?.value ?? null) === null ? 'no law' : `${breakRow?.value ?? ''}\u2009kV`,
          pressure,
        ]}
        muted={2}
      />
      <Lines
        x={first.x + 8}
        y={middle + 62}
        anchor="start"
        lines={[`${firstRow?.value ?? '\u2013'}\u2009nF`, short(names.first)]}
        muted={1}
      />
      <Lines
        x={second.x - 8}
        y={middle + 62}
        anchor="end"
        lines={[`${secondRow?.value ?? '\u2013'}\u2009nF`, short(names.second)]}
        muted={1}
      />
      {channel.upright ? (
        <Lines x={channel.x} y={ground + 28} anchor="middle" lines={[channelText]} />
      ) : (
        <Lines x={channel.x} y={rail + 46} anchor="middle" lines={[channelText]} />
      )}
      {acrossText === null ? null : channel.upright ? (
        <Lines
          x={channel.x + acrossAside(plan) + 20}
          y={middle - 6}
          anchor="start"
          lines={acrossText.split('\u2009')}
        />
      ) : (
        <Lines x={channel.x} y={rail - acrossAside(plan) * 0.7 - 18} anchor="middle" lines={[acrossText]} />
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

/** What stands across the channel, on one line; null where nothing does. */
function acrossWords({ topology, channel, charging }: RigSpec): string | null {
  const resistor = channel.across_kohm === null ? null : `${channel.across_kohm}\u2009kΩ`;
  if (topology === 'charge-transfer' || charging.inductor_uH === undefined) return resistor;
  const coil = `${charging.inductor_uH}\u2009µH`;
  return resistor === null ? coil : `${coil}, ${resistor}`;
}

function short(name: string): string {
  return name.replace(' capacitor', '');
}

function spacing({ channel }: RigSpec): string {
  const { spacing_a_mm, spacing_b_mm } = channel;
  return spacing_a_mm === spacing_b_mm ? String(spacing_a_mm) : `${spacing_a_mm} to ${spacing_b_mm}`;
}
