import type { ReadingValues } from '../book/bodies/firing-bodies';
import type { Role } from '../book/bodies/people-bodies';
import type { Verdict } from '../book/entry';
import type { RigSpec } from '../book/rig-spec';
import type { SheetSpec } from '../book/sheet-spec';
import type { DeclaredState } from '../rules/declared-view';

/** The one place where codes of the Book become words on screens and in reports. */
export const DECLARED_WORDS: Readonly<Record<DeclaredState, string>> = {
  shorted: 'Shorted, declared',
  'short-off': 'Short off',
  firing: 'Firing',
  'not-known': 'Not known: treat as charged',
};

export const LOOK_WORDS: Readonly<Record<ReadingValues['looked'], string>> = {
  even: 'even',
  'arc-a-end': 'arc, A end',
  'arc-mid': 'arc, mid',
  'arc-b-end': 'arc, B end',
  'arc-both-ends': 'arcs, both ends',
  'surface-flashover': 'surface flashover',
  'gap-dark': 'gap dark',
  'gap-fired-channel-dark': 'gap fired, channel dark',
  'discharge-no-beam': 'discharge, no beam',
  'early-break': 'early break',
  'gap-stays-lit': 'gap stays lit',
  puncture: 'puncture',
};

export const HOW_WORDS: Readonly<Record<ReadingValues['how'], string>> = {
  set: 'set',
  held: 'held',
  'self-break': 'self-break',
};

export const ROLE_WORDS: Readonly<Record<Role, string>> = {
  operator: 'operator',
  reviewer: 'reviewer',
  lead: 'lead',
  reader: 'reader',
};

export const VERDICT_WORDS: Readonly<Record<Verdict, string>> = {
  applied: 'in the Book',
  irregular: 'irregular',
  'held-back': 'held back',
};

export const PURPOSE_WORDS: Readonly<Record<SheetSpec['purpose'], string>> = {
  'before-firing': 'Before firing',
  'make-safe': 'Make safe',
  'gas-change': 'Gas change',
  'dye-handling': 'Dye handling',
  'weekly-care': 'Weekly care',
};

export const TOPOLOGY_WORDS: Readonly<Record<RigSpec['topology'], string>> = {
  'lc-inversion': 'LC inversion',
  'charge-transfer': 'charge transfer',
};

/** Names of the two capacitors as each circuit calls them. */
export const CAPACITOR_WORDS: Readonly<
  Record<RigSpec['topology'], { readonly first: string; readonly second: string }>
> = {
  'lc-inversion': { first: 'C1', second: 'C2' },
  'charge-transfer': { first: 'dump capacitor', second: 'peaking capacitor' },
};

/** Gases as letters with lowered figures are set by the screen; here they are plain. */
export const GAS_WORDS: Readonly<Record<RigSpec['gap']['gas'], string>> = {
  air: 'air',
  N2: 'N2',
  CO2: 'CO2',
  SF6: 'SF6',
  H2: 'H2',
  O2: 'O2',
  Ar: 'Ar',
  Ne: 'Ne',
  He: 'He',
};
