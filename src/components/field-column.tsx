import type { ReactNode } from 'react';

/** The inputs or readings beside the figure. */
export function FieldColumn({ label, children }: { readonly label: string; readonly children: ReactNode }) {
  return (
    <section className="field-column" aria-label={label}>
      {children}
    </section>
  );
}
