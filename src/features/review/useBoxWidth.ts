import { useEffect, useRef, useState } from 'react';

/** The width of a box in pixels, so that a drawing's letters stay readable on a phone. */
export function useBoxWidth<Box extends HTMLElement>(first: number) {
  const ref = useRef<Box>(null);
  const [width, setWidth] = useState(first);
  useEffect(() => {
    const box = ref.current;
    if (!box) return;
    const observer = new ResizeObserver(([entry]) => {
      if (entry) setWidth(Math.max(240, Math.round(entry.contentRect.width)));
    });
    observer.observe(box);
    return () => observer.disconnect();
  }, []);
  return [ref, width] as const;
}
