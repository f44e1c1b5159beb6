import { useId, type ReactNode } from 'react';

export interface MethodSectionProps {
  title: string;
  children: ReactNode;
}

/** A heading at the left and its text at the right, where there is room. */
export function MethodSection({ title, children }: MethodSectionProps) {
  const headingId = useId();
  return (
    <section
      aria-labelledby={headingId}
      className="grid gap-x-10 gap-y-2 border-t border-hairline pt-5 lg:grid-cols-[18rem_1fr]"
    >
      <h2 id={headingId}>{title}</h2>
      <div className="measure grid gap-3">{children}</div>
    </section>
  );
}
