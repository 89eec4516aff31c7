import type { ReadingValues } from '../../domain/book/bodies/firing-bodies';
import { GAS_WORDS } from '../../domain/report/words';

/** A gas by its letters, figures lowered. */
export function GasLetters({ gas }: { readonly gas: ReadingValues['gas'] }) {
  const [, letters = GAS_WORDS[gas], figure] = /^([A-Za-z]+)(\d)?$/.exec(GAS_WORDS[gas]) ?? [];
  return (
    <>
      {letters}
      {figure === undefined ? null : <sub>{figure}</sub>}
    </>
  );
}
