import { useEffect, useRef, useState, type ReactNode } from 'react';
import { useLocation } from 'react-router-dom';

export interface PageHeadingProps {
  children: ReactNode;
  /** The page's title where the heading is more than a text. */
  title?: string;
  className?: string;
}

/** The page's one `h1`: it names the browser's tab and takes the focus after a navigation. */
export function PageHeading({ children, title, className = '' }: PageHeadingProps) {
  const heading = useRef<HTMLHeadingElement>(null);
  const { key, pathname } = useLocation();
  // The page at which the visit began keeps the browser's own focus.
  const [firstPathname] = useState(key === 'default' ? pathname : null);
  useEffect(() => {
    if (pathname !== firstPathname) heading.current?.focus({ preventScroll: true });
  }, [pathname, firstPathname]);
  const text = title ?? (typeof children === 'string' ? children : '');
  return (
    <>
      <title>{text === '' ? 'Noonmark' : `${text} · Noonmark`}</title>
      <h1 ref={heading} tabIndex={-1} className={className}>
        {children}
      </h1>
    </>
  );
}
