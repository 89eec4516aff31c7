import type { RigSpec } from '../../domain/book/rig-spec';

/** A gas as chemists set it: figures lowered. */
export function Gas({ name }: { readonly name: RigSpec['gap']['gas'] }) {
  const [letters = '', figure = ''] = name.split(/(?=\d)/);
  return (
    <>
      {letters}
      {figure === '' ? null : <sub>{figure}</sub>}
    </>
  );
}
