import { answer, type Answer, type Basis, type Warning } from '../units/answer';
import { checkNumber } from '../units/check-number';
import { firstRefusal, ok, refused, type Refusal, type Result } from '../units/result';
import { CAPACITANCE_RULE, VOLTAGE_RULE } from './energy';

/** A wait is never shorter than this, whatever the figures say. */
export const SHORTEST_WAIT_S = 60;

export const RESISTANCE_RULE = {
  field: 'resistance_ohm',
  name: 'Resistance',
  unit: '\u2126',
  min: 1e-3,
  max: 1e15,
} as const;

/** Something that stays charged by itself, with the resistor that bleeds it. */
export interface ChargedNode {
  readonly name: string;
  readonly capacitance_F: number;
  /** Null where the bleed is not known; then no wait can be given at all. */
  readonly bleed_ohm: number | null;
}

/** Time to bleed from one voltage to another, s: R C ln(V0/Vs). Absorbed charge comes back: keep it shorted. */
export function bleedTime(
  node: { readonly resistance_ohm: number; readonly capacitance_F: number },
  from_V: number,
  to_V: number,
): Result<Answer> {
  const bad = firstRefusal([
    checkNumber(node.resistance_ohm, RESISTANCE_RULE),
    checkNumber(node.capacitance_F, CAPACITANCE_RULE),
    checkNumber(from_V, VOLTAGE_RULE),
    checkNumber(to_V, { ...VOLTAGE_RULE, field: 'discharged_below_V', name: 'Discharged below', min: 1e-3 }),
  ]);
  if (bad !== undefined) return refused(bad);
  const value = from_V <= to_V ? 0 : node.resistance_ohm * node.capacitance_F * Math.log(from_V / to_V);
  return ok(
    answer({
      value,
      unit: 's',
      relative: { below: 0.1, above: 0.3 },
      model: 'Exponential through the bleed resistor',
      valid: 'the bleed is whole; a voltage is proven by a meter, never by a wait',
    }),
  );
}

/** Power in a bleed resistor, W: V squared over R. Its voltage rating matters as much. */
export function bleedPower(resistance_ohm: number, voltage_V: number): Result<Answer> {
  const bad = firstRefusal([
    checkNumber(resistance_ohm, RESISTANCE_RULE),
    checkNumber(voltage_V, VOLTAGE_RULE),
  ]);
  if (bad !== undefined) return refused(bad);
  return ok(
    answer({
      value: voltage_V ** 2 / resistance_ohm,
      unit: 'W',
      relative: 0,
      model: 'Voltage squared over resistance',
      valid: 'resistor rated for the full voltage',
    }),
  );
}

/** The wait before the stick, or the reason why there is no number. */
export type BleedWait = Basis &
  (
    | {
        readonly type: 'known';
        /** Whole seconds, rounded up, at least 60. Ends in "voltage not proven: short now". */
        readonly wait_s: number;
        readonly computed_s: number;
        readonly slowest: string;
        /** Of the slowest node, with what the bleed resistor leaves open. */
        readonly slowestTime: Answer;
        readonly nodes: readonly { readonly name: string; readonly computed_s: number }[];
      }
    | { readonly type: 'unknown'; readonly nodes: readonly string[]; readonly words: string }
  );

const NOT_PROVEN: Warning = {
  type: 'not-proven',
  words: 'A wait proves nothing: measure, short with the stick, and leave the short on.',
};
const WAIT_BASIS: Basis = {
  model: 'Slowest node through its own bleed, from the supply\u2019s limit',
  valid: 'every bleed whole; never under 60\u2009s',
  warnings: [NOT_PROVEN],
};

/**
 * How long every charged node needs, taken from the supply's limit. One unknown bleed leaves no number at all:
 * a wait that covers only the other nodes would be read as covering all.
 */
export function bleedWait(
  nodes: readonly ChargedNode[],
  from: { readonly supply_V: number; readonly discharged_below_V: number },
): Result<BleedWait> {
  if (nodes.length === 0) {
    return refused({
      type: 'empty',
      field: 'nodes',
      words: 'Nodes: name every node that stays charged by itself.',
    });
  }
  const unknown = nodes.filter(({ bleed_ohm }) => bleed_ohm === null).map(({ name }) => name);
  const computed: { readonly name: string; readonly computed_s: number; readonly time: Answer }[] = [];
  for (const { name, capacitance_F, bleed_ohm } of nodes) {
    // An unknown bleed still has its other figures checked, so that a bad one is not hidden behind it.
    const time = bleedTime(
      { resistance_ohm: bleed_ohm ?? 1, capacitance_F },
      from.supply_V,
      from.discharged_below_V,
    );
    if (!time.ok) return refused(named(time.refusal, name));
    computed.push({ name, computed_s: time.value.value, time: time.value });
  }
  if (unknown.length > 0) {
    return ok({
      ...WAIT_BASIS,
      type: 'unknown',
      nodes: unknown,
      words: `No wait can be computed: the bleed of ${unknown.join(', ')} is not known. Treat it as charged and short it with the stick.`,
    });
  }
  const slowest = computed.reduce((worst, node) => (node.computed_s > worst.computed_s ? node : worst));
  return ok({
    ...WAIT_BASIS,
    type: 'known',
    wait_s: Math.max(SHORTEST_WAIT_S, Math.ceil(slowest.computed_s)),
    computed_s: slowest.computed_s,
    slowest: slowest.name,
    slowestTime: slowest.time,
    nodes: computed.map(({ name, computed_s }) => ({ name, computed_s })),
  });
}

/**
 * The nodes of an LC inversion, worst cases included: each capacitor by itself, since the charging element may be
 * open, and both on the weaker bleed, since the element may be whole and the other bleed open.
 */
export function inversionNodes(
  first: ChargedNode,
  second: ChargedNode,
): readonly [ChargedNode, ChargedNode, ChargedNode] {
  const bleeds = [first.bleed_ohm, second.bleed_ohm];
  const weaker = bleeds.includes(null) ? null : Math.max(...bleeds.map((ohm) => ohm ?? Infinity));
  return [
    first,
    second,
    {
      name: `${first.name} and ${second.name} on one bleed`,
      capacitance_F: first.capacitance_F + second.capacitance_F,
      bleed_ohm: weaker,
    },
  ];
}

function named(refusal: Refusal, node: string): Refusal {
  return { ...refusal, words: `${node}: ${refusal.words}` };
}
