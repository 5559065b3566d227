import { useEffect, useState } from 'react';

/** The present, moved on at the start of each minute. */
export const useMinute = (): Date => {
  const [now, setNow] = useState(() => new Date());
  useEffect(() => {
    const untilNextMinuteMs = 60_000 - (now.getTime() % 60_000) + 20;
    const timer = window.setTimeout(() => setNow(new Date()), untilNextMinuteMs);
    return () => window.clearTimeout(timer);
  }, [now]);
  return now;
};
