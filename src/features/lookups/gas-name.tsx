/** A gas as chemists write it, figures lowered. */
export function GasName({ name }: { readonly name: string }) {
  const [letters = name, figure] = name.split(/(?<=[A-Z])(?=\d)/);
  return (
    <span>
      {letters}
      {figure === undefined ? null : <sub>{figure}</sub>}
    </span>
  );
}
