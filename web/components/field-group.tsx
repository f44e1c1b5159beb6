import { useId, type ReactNode } from 'react';

export interface FieldGroupProps {
  legend: string;
  description?: ReactNode;
  /** What is wrong with the group as a whole, as a sentence. */
  problem?: string | undefined;
  children: ReactNode;
  className?: string;
}

/** Fields that belong together under one name. */
export function FieldGroup({
  legend,
  description,
  problem,
  children,
  className = '',
}: FieldGroupProps) {
  const id = useId();
  return (
    <fieldset
      className={`grid min-w-0 content-start gap-2 border-t border-hairline pt-3 ${className}`}
      aria-describedby={problem === undefined ? undefined : id}
    >
      <legend className="float-left w-full font-strong">{legend}</legend>
      {description === undefined ? null : <p className="text-small text-ink-soft">{description}</p>}
      {children}
      {problem === undefined ? null : (
        <p id={id} className="text-small font-strong text-madder">
          ✕ {problem}
        </p>
      )}
    </fieldset>
  );
}
