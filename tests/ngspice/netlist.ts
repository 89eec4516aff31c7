import type { Circuit } from '../../src/domain/circuit/circuit-input';

/** How ngspice is to compute. */
export interface Fineness {
  /** Largest step as a share of the window. */
  readonly stepShare: number;
  readonly relativeTolerance: number;
}

/** Volts for every ampere squared second on the node that integrates the gap's current. */
const ACTION_SCALE = 1e6;
const OPEN_S = 1e-12;

/**
 * The deck of a circuit. ngspice has no switch that latches without a width of its own, so the breakdown is a time that
 * an earlier run with the channel open has found (`fired_s`, null for that run).
 */
export function netlist(
  circuit: Circuit,
  { fineness, fired_s }: { readonly fineness: Fineness; readonly fired_s: number | null },
): readonly string[] {
  const { window_s } = circuit;
  const step = (window_s * fineness.stepShare).toExponential(12);
  return [
    '* one circuit of the cross-check',
    ...parts(circuit),
    ...gap(circuit),
    ...channel(circuit, fired_s),
    `.option reltol=${String(fineness.relativeTolerance)} abstol=1e-9 vntol=1e-5 chgtol=1e-13`,
    '.save v(hot) v(cold) i(vg) i(vch)',
    `.tran ${step} ${window_s.toExponential(12)} 0 ${step} uic`,
  ];
}

/** Capacitors and feed. The channel lies between `hot` and `cold`, the gap between `live` and `shut`. */
function parts(circuit: Circuit): readonly string[] {
  if (circuit.topology === 'charge-transfer') {
    const { dump_F, peaking_F, bleed_ohm, charge_V } = circuit;
    return [
      `Cdump live 0 ${String(dump_F)} ic=${String(charge_V)}`,
      `Cpeak hot 0 ${String(peaking_F)} ic=0`,
      bleed_ohm === null ? '* no bleed' : `Rbleed hot 0 ${String(bleed_ohm)}`,
      'Vcold cold 0 0',
      'Vshut shut hot 0',
    ];
  }
  const { first_F, second_F, charging_H, charging_ohm, charge_V } = circuit;
  return [
    `Cfirst live 0 ${String(first_F)} ic=${String(charge_V)}`,
    `Csecond hot 0 ${String(second_F)} ic=${String(charge_V)}`,
    `Lcharge live mid ${String(charging_H)} ic=0`,
    `Rcharge mid hot ${String(charging_ohm)}`,
    'Vcold cold live 0',
    'Vshut shut 0 0',
  ];
}

function gap({ gap_H, gap: law }: Circuit): readonly string[] {
  const branch = [`Lgap live g1 ${String(gap_H)} ic=0`, 'Vg g1 g2 0'];
  if (law.law === 'exponential') {
    const { end_ohm, start_ohm, fall_s } = law;
    return [
      ...branch,
      `Bgap g2 shut V=(${String(end_ohm)}+${String(start_ohm)}*exp(-time/${String(fall_s)}))*i(Vg)`,
    ];
  }
  const { end_ohm, start_ohm, gap_cm, pressure_atm_abs, constant_cm2_atm_V2s } = law;
  const perAction = (2 * constant_cm2_atm_V2s) / pressure_atm_abs;
  const seed = (gap_cm / start_ohm) ** 2 / perAction;
  return [
    ...branch,
    `Bsquare 0 act I=i(Vg)*i(Vg)`,
    `Caction act 0 ${String(1 / ACTION_SCALE)} ic=0`,
    `Bgap g2 shut V=(${String(end_ohm)}+${String(gap_cm)}/sqrt(${String(perAction)}*(v(act)/${String(ACTION_SCALE)}+${String(seed)})))*i(Vg)`,
  ];
}

function channel({ channel: law, window_s }: Circuit, fired_s: number | null): readonly string[] {
  const branch = [`Lchannel c1 cold ${String(law.inductance_H)} ic=0`, 'Vch c2 c1 0'];
  if (fired_s === null) return [...branch, `Gopen hot c2 hot c2 ${String(OPEN_S)}`];
  const { end_ohm, start_ohm, fall_s } = law;
  const at = fired_s.toExponential(15);
  const falling = `1/(${String(end_ohm)}+${String(start_ohm)}*exp(-(time-${at})/${String(fall_s)}))`;
  return [
    ...branch,
    `Bchannel hot c2 I=(time<${at} ? ${String(OPEN_S)} : ${falling})*v(hot,c2)`,
    // An edge makes ngspice put a point there instead of stepping over the breakdown.
    `Vedge edge 0 PULSE(0 1 ${at} 1e-12 1e-12 ${String(2 * window_s)} ${String(4 * window_s)})`,
    'Redge edge 0 1',
  ];
}
