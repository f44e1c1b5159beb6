import { useId, type ReactNode } from 'react';

/** One family of parts, under its name. */
export function DesignSection({ title, children }: { title: string; children: ReactNode }) {
  const headingId = useId();
  return (
    <section aria-labelledby={headingId} className="grid gap-5 border-t border-ink pt-4">
      <h2 id={headingId}>{title}</h2>
      {children}
    </section>
  );
}

/** One part in one state, with the state's name below it. */
export function Specimen({ name, children }: { name: string; children: ReactNode }) {
  return (
    <figure className="grid content-start gap-2">
      <div>{children}</div>
      <figcaption className="label-caps">{name}</figcaption>
    </figure>
  );
}
