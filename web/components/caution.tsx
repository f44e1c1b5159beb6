import { Link } from 'react-router-dom';

export interface CautionProps {
  /** Where the method is explained. */
  methodHref: string;
  className?: string;
}

/** The limits that go with every figure. */
export function Caution({ methodHref, className = '' }: CautionProps) {
  return (
    <p className={`measure text-small text-ink-soft ${className}`}>
      A planning-level study of the massing as submitted. It is no survey and no legal opinion: the
      local code and licensed professionals decide.{' '}
      <Link to={methodHref} className="link">
        How it is computed
      </Link>
    </p>
  );
}
