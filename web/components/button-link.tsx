import { Link, type LinkProps } from 'react-router-dom';

export interface ButtonLinkProps extends LinkProps {
  kind?: 'primary' | 'secondary';
  className?: string;
}

const kinds = {
  primary: 'bg-ink text-paper hover:bg-ink-soft',
  secondary: 'hover:bg-ink/5',
} as const;

/** A link to another page that is the next thing to do, and so looks like a button. */
export function ButtonLink({ kind = 'secondary', className = '', ...props }: ButtonLinkProps) {
  return (
    <Link
      {...props}
      className={`no-print inline-flex items-center justify-center border border-ink px-4 py-2 font-strong leading-snug ${kinds[kind]} ${className}`}
    />
  );
}
