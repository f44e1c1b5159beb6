import { useEffect, useRef, useState, type RefObject } from 'react';

/** The width of an element in CSS pixels, followed as it changes; null before it is known. */
export function useWidth<Target extends Element>(): [RefObject<Target | null>, number | null] {
  const target = useRef<Target>(null);
  const [width, setWidth] = useState<number | null>(null);
  useEffect(() => {
    const element = target.current;
    if (element === null) return;
    const observer = new ResizeObserver(() => setWidth(element.getBoundingClientRect().width));
    observer.observe(element);
    return () => observer.disconnect();
  }, []);
  return [target, width];
}
