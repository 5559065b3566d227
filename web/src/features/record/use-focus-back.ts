import { useEffect, useRef } from 'react';

interface Origin {
  trigger: HTMLElement;
  heading: HTMLElement | null;
}

/**
 * Where the focus goes when what a button opened has closed: to the button, or to its section's heading when the
 * button is gone. Returns what to call with the button when it opens something.
 */
export const useFocusBack = (open: boolean): ((trigger: HTMLElement) => void) => {
  const origin = useRef<Origin | null>(null);
  useEffect(() => {
    if (open || !origin.current) return undefined;
    const { trigger, heading } = origin.current;
    origin.current = null;
    // A dialog lets go of the focus in a timer of its own, which is set before this one.
    const timer = window.setTimeout(() => (trigger.isConnected ? trigger : heading)?.focus());
    return () => window.clearTimeout(timer);
  }, [open]);
  return (trigger) => {
    origin.current = { trigger, heading: trigger.closest('section')?.querySelector<HTMLElement>('h2') ?? null };
  };
};
