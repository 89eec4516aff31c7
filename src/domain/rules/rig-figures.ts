import type { CapacitorSpec, LabSettings, RigSpec } from '../book/rig-spec';
import { bleedWait, inversionNodes, type BleedWait, type ChargedNode } from '../capacitor/bleed';
import { plyThickness_m, sheetCapacitance } from '../capacitor/capacitance';
import { storedEnergy } from '../capacitor/energy';
import { hazardBand, type HazardBand } from '../capacitor/hazard';
import type { Charging } from '../charging/supply-reach';
import { ok, type Result } from '../units/result';

/** Figures of a rig that screens and checks lean on, all from the supply's limit. */
export interface RigFigures {
  readonly first_F: number;
  readonly second_F: number;
  /** What the rig stores when charged to the supply's limit, J; round it up. */
  readonly stored_J: number;
  readonly hazard: HazardBand;
  readonly wait: BleedWait;
}

export function rigFigures(
  spec: RigSpec,
  settings: Pick<LabSettings, 'discharged_below_V'>,
): Result<RigFigures> {
  const first = capacitance_F(spec.first);
  if (!first.ok) return first;
  const second = capacitance_F(spec.second);
  if (!second.ok) return second;
  const { supply_kV, supply_mA } = spec.charging;
  const stored = storedEnergy(storing_F(spec, first.value, second.value), supply_kV * 1000);
  if (!stored.ok) return stored;
  const hazard = hazardBand(storing_F(spec, first.value, second.value), { kV: supply_kV, mA: supply_mA });
  if (!hazard.ok) return hazard;
  const wait = rigWait(spec, settings);
  if (!wait.ok) return wait;
  return ok({
    first_F: first.value,
    second_F: second.value,
    stored_J: stored.value.value,
    hazard: hazard.value,
    wait: wait.value,
  });
}

/** Energy stored at a voltage below the supply's limit, J. */
export function storedAt_J(spec: RigSpec, voltage_kV: number): Result<number> {
  const first = capacitance_F(spec.first);
  if (!first.ok) return first;
  const second = capacitance_F(spec.second);
  if (!second.ok) return second;
  const stored = storedEnergy(storing_F(spec, first.value, second.value), voltage_kV * 1000);
  return stored.ok ? ok(stored.value.value) : stored;
}

/** The wait before the stick, over every node that stays charged by itself. */
export function rigWait(
  spec: RigSpec,
  { discharged_below_V }: Pick<LabSettings, 'discharged_below_V'>,
): Result<BleedWait> {
  const nodes = chargedNodes(spec);
  if (!nodes.ok) return nodes;
  return bleedWait(nodes.value, { supply_V: spec.charging.supply_kV * 1000, discharged_below_V });
}

export function capacitance_F(capacitor: CapacitorSpec): Result<number> {
  if (capacitor.kind === 'bank') return ok(capacitor.capacitance_nF * 1e-9);
  const thickness = plyThickness_m(capacitor.plies, capacitor.ply_um);
  if (!thickness.ok) return thickness;
  const sheet = sheetCapacitance({
    eps_r: capacitor.eps_r,
    area_m2: capacitor.length_mm * capacitor.width_mm * 1e-6,
    thickness_m: thickness.value,
    layers: capacitor.plate_pairs,
  });
  return sheet.ok ? ok(sheet.value.value) : sheet;
}

/** In an LC inversion both capacitors are charged; in charge transfer only the dump capacitor is. */
function storing_F(spec: RigSpec, first_F: number, second_F: number): number {
  return spec.topology === 'lc-inversion' ? first_F + second_F : first_F;
}

function chargedNodes(spec: RigSpec): Result<readonly ChargedNode[]> {
  const nodes: ChargedNode[] = [];
  for (const node of spec.nodes) {
    const farad = capacitance_F(node.holds === 'first' ? spec.first : spec.second);
    if (!farad.ok) return farad;
    nodes.push({
      name: node.name,
      capacitance_F: farad.value,
      bleed_ohm: node.bleed_Mohm === null ? null : node.bleed_Mohm * 1e6,
    });
  }
  const [first, second] = nodes;
  if (spec.topology === 'lc-inversion' && nodes.length === 2 && first !== undefined && second !== undefined) {
    return ok(inversionNodes(first, second));
  }
  return ok(nodes);
}

/** Supply, ballast and the bleeds that load it while the gap stays shut. An unknown bleed counts as none. */
export function chargingOf(spec: RigSpec): Charging {
  const loading =
    spec.topology === 'lc-inversion' ? spec.nodes : spec.nodes.filter((node) => node.holds === 'first');
  const conductance = loading.reduce(
    (sum, node) => sum + (node.bleed_Mohm === null ? 0 : 1 / node.bleed_Mohm),
    0,
  );
  return { ...spec.charging, bleed_Mohm: conductance === 0 ? null : 1 / conductance };
}
