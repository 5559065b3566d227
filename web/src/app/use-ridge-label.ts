import { useCallback, useLayoutEffect, useState, type RefObject } from 'react';

export interface MeasuredLabel {
  width: number;
  label: { left: number; right: number } | null;
}

/**
 * Where the current label stands in its bar. Measured again when fonts load, on resize and when the areas change,
 * because the hill rises under the label and nowhere else.
 */
export const useRidgeLabel = (bar: RefObject<HTMLElement | null>, watch: string): MeasuredLabel | null => {
  const [measured, setMeasured] = useState<MeasuredLabel | null>(null);

  const measure = useCallback(() => {
    const element = bar.current;
    if (!element) return;
    const box = element.getBoundingClientRect();
    const current = element.querySelector('[aria-current="page"] [data-ridge-label]')?.getBoundingClientRect();
    const scroll = element.scrollLeft;
    setMeasured({
      width: Math.max(element.scrollWidth, box.width),
      label: current ? { left: current.left - box.left + scroll, right: current.right - box.left + scroll } : null,
    });
  }, [bar]);

  useLayoutEffect(() => {
    measure();
    const element = bar.current;
    if (!element) return undefined;
    const observer = new ResizeObserver(measure);
    observer.observe(element);
    let alive = true;
    void document.fonts?.ready.then(() => alive && measure());
    return () => {
      alive = false;
      observer.disconnect();
    };
  }, [bar, measure, watch]);

  return measured;
};
