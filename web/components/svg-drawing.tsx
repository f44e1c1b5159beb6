import { useLayoutEffect, useRef } from 'react';

export interface SvgDrawingProps {
  /** A whole SVG document, made by shared/drawing. */
  markup: string;
  className?: string;
}

/** Puts a drawing into the page as elements, so that it takes the page's fonts and is read aloud by its label. */
export function SvgDrawing({ markup, className = '' }: SvgDrawingProps) {
  const holder = useRef<HTMLDivElement>(null);
  useLayoutEffect(() => {
    const drawing = new DOMParser().parseFromString(markup, 'image/svg+xml').documentElement;
    // The drawing scales with the page; its viewBox keeps the proportions.
    drawing.removeAttribute('width');
    drawing.removeAttribute('height');
    holder.current?.replaceChildren(document.importNode(drawing, true));
  }, [markup]);
  return (
    <div ref={holder} className={`[&>svg]:block [&>svg]:h-auto [&>svg]:w-full ${className}`} />
  );
}
