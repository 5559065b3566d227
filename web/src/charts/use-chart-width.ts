import { useParentSize } from '@visx/responsive';
import { useEffect, useState } from 'react';
import { flushSync } from 'react-dom';

/** About the text column of a printed page at the scale a summary prints in. */
const printedPx = 870;

const usePrinting = (): boolean => {
  const [printing, setPrinting] = useState(false);
  useEffect(() => {
    const begin = (): void => flushSync(() => setPrinting(true));
    const end = (): void => setPrinting(false);
    window.addEventListener('beforeprint', begin);
    window.addEventListener('afterprint', end);
    return () => {
      window.removeEventListener('beforeprint', begin);
      window.removeEventListener('afterprint', end);
    };
  }, []);
  return printing;
};

/** The room a chart has; on paper the page's own width, so that type keeps its size. */
export const useChartWidth = (initialPx: number) => {
  const printing = usePrinting();
  const { parentRef, width } = useParentSize({
    initialSize: { width: initialPx },
    debounceTime: 40,
    enableDebounceLeadingCall: true,
    ignoreDimensions: ['height', 'top', 'left'],
  });
  return { parentRef, width: printing ? printedPx : width > 0 ? width : initialPx };
};
