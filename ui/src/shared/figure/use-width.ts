import { useLayoutEffect, useRef, useState } from 'react';

/** Width of the element that gets the ref [px], followed while it changes; drawings are made at 1 : 1. */
export function useWidth(first: number) {
  const ref = useRef<HTMLDivElement>(null);
  const [widthPx, setWidth] = useState(first);
  useLayoutEffect(() => {
    const element = ref.current;
    if (!element) return undefined;
    const take = (width: number) => width > 0 && setWidth(Math.floor(width));
    take(element.clientWidth);
    const watch = new ResizeObserver(([entry]) => entry && take(entry.contentRect.width));
    watch.observe(element);
    return () => watch.disconnect();
  }, []);
  return [ref, widthPx] as const;
}
