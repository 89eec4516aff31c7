import type { ReactNode } from 'react';

/** Words that stand beside a number that can hurt; a blunt face marks them. */
export function Caution({ children }: { readonly children: ReactNode }) {
  return (
    <p className="caution" role="note">
      {children}
    </p>
  );
}
