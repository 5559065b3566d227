import { useEffect, useState } from 'react';

export const useDebounced = <Value>(value: Value, delayMs: number): Value => {
  const [settled, setSettled] = useState(value);
  useEffect(() => {
    const timer = window.setTimeout(() => setSettled(value), delayMs);
    return () => window.clearTimeout(timer);
  }, [value, delayMs]);
  return settled;
};
