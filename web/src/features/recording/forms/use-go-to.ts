import { useCallback, useEffect, useState } from 'react';

/** Puts the focus on a field, also one that a change of tab has yet to draw. */
export const useGoTo = (
  setFocus: (field: string) => void,
  reveal?: (field: string) => void,
): ((field: string) => void) => {
  const [wanted, setWanted] = useState<{ field: string } | null>(null);
  useEffect(() => {
    if (wanted) setFocus(wanted.field);
    // Only a new wish moves the focus, not a new function.
    // eslint-disable-next-line react-hooks/exhaustive-deps -- setFocus of the form never changes its meaning
  }, [wanted]);
  return useCallback(
    (field: string) => {
      reveal?.(field);
      setWanted({ field });
    },
    [reveal],
  );
};
