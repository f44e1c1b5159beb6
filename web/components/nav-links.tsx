import type { ReactNode } from 'react';
import { NavLink } from 'react-router-dom';

export interface NavLinksProps {
  /** What the links lead through; read aloud. */
  label: string;
  links: readonly { to: string; label: ReactNode; end?: boolean }[];
  className?: string;
}

/** Links between the parts of one thing; the open one is underlined and says so. */
export function NavLinks({ label, links, className = '' }: NavLinksProps) {
  return (
    <nav aria-label={label} className={className}>
      <ul className="flex flex-wrap gap-x-5 gap-y-1">
        {links.map((link) => (
          <li key={link.to}>
            <NavLink
              to={link.to}
              end={link.end ?? false}
              className={({ isActive }) =>
                `inline-block border-b-2 py-1 ${
                  isActive ? 'border-ink font-strong' : 'border-transparent hover:border-hairline'
                }`
              }
            >
              {link.label}
            </NavLink>
          </li>
        ))}
      </ul>
    </nav>
  );
}
