import type { GasName } from '../../domain/gap/gas-table';

/** A gas as chemists write it, figures lowered. */
export function Gas({ name }: { readonly name: GasName }) {
  const [letters = name, figure] = name.split(/(?<=[A-Z])(?=\d)/);
  return (
    <span>
      {letters}
      {figure === undefined ? null : <sub>{figure}</sub>}
    </span>
  );
}
