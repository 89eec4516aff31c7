import type { BodyOf } from '../../../domain/book/kinds';
import type { RigSpec } from '../../../domain/book/rig-spec';
import { CAPACITOR_WORDS } from '../../../domain/report/words';

export type PartPlace = BodyOf<'part.fitted'>['place'];

const PLACES: Readonly<Record<Exclude<PartPlace, 'first' | 'second'>, string>> = {
  'spark-gap': 'spark gap',
  channel: 'laser channel',
  charging: 'supply and charging',
  bleed: 'bleeds',
  gas: 'gas',
  beam: 'beam',
  other: 'elsewhere',
};

export const PLACE_ORDER: readonly PartPlace[] = [
  'spark-gap',
  'first',
  'second',
  'channel',
  'charging',
  'bleed',
  'gas',
  'beam',
  'other',
];

/** Where in the circuit a part works, as its circuit calls it. */
export function placeWords(place: PartPlace, topology: RigSpec['topology']): string {
  return place === 'first' || place === 'second' ? CAPACITOR_WORDS[topology][place] : PLACES[place];
}
