import {
  Button as AriaButton,
  type ButtonProps as AriaButtonProps,
} from 'react-aria-components/Button';

export interface ButtonProps extends Omit<AriaButtonProps, 'className' | 'style'> {
  /** `primary` once on a page or form; `plain` reads as a link. */
  kind?: 'primary' | 'secondary' | 'plain' | 'danger';
  className?: string;
}

// What is done on a screen is not printed; a plain button reads as text, and stays.
const kinds = {
  primary:
    'no-print border border-ink bg-ink px-4 py-2 font-strong text-paper data-hovered:bg-ink-soft data-pressed:bg-ink-soft',
  secondary:
    'no-print border border-ink px-4 py-2 font-strong data-hovered:bg-ink/5 data-pressed:bg-ink/10',
  danger:
    'no-print border border-madder px-4 py-2 font-strong text-madder data-hovered:bg-madder/5 data-pressed:bg-madder/10',
  plain: 'link py-0.5',
} as const;

/** A button; while `isPending` it stays focusable and does nothing. */
export function Button({ kind = 'secondary', className = '', ...props }: ButtonProps) {
  return (
    <AriaButton
      {...props}
      className={`inline-flex min-h-6 min-w-6 cursor-pointer items-center justify-center gap-2 text-start leading-snug data-disabled:cursor-not-allowed data-disabled:opacity-50 data-pending:cursor-progress data-pending:opacity-70 ${kinds[kind]} ${className}`}
    />
  );
}
