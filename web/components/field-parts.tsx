import type { ReactNode } from 'react';
import { FieldError } from 'react-aria-components/FieldError';
import { Label } from 'react-aria-components/Label';
import { Text } from 'react-aria-components/Text';

/** The look that every input shares. */
export const inputClass =
  'w-full border border-ink bg-sheet px-3 py-2 text-body text-ink placeholder:text-ink-soft data-disabled:opacity-60 data-invalid:border-madder data-invalid:border-2';

/** The label of a field; what may be left out is marked, since most may not. */
export function FieldLabel({
  children,
  optional = false,
}: {
  children: ReactNode;
  optional?: boolean;
}) {
  return (
    <Label className="block font-strong">
      {children}
      {optional ? <span className="font-normal text-ink-soft"> (optional)</span> : null}
    </Label>
  );
}

export function FieldDescription({ children }: { children?: ReactNode }) {
  if (children === undefined || children === null) return null;
  return (
    <Text slot="description" className="block text-small text-ink-soft">
      {children}
    </Text>
  );
}

/** What is wrong with the field: a cross and a sentence. */
export function FieldProblem({ children }: { children?: ReactNode }) {
  return (
    <FieldError className="block text-small font-strong text-madder">
      {children === undefined ? undefined : <>✕ {children}</>}
    </FieldError>
  );
}
