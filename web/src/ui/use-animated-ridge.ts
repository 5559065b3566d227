import { useEffect, useRef, useState } from 'react';
import { useReducedMotion } from '../lib/use-media-query';
import { betweenRidges, type RidgeShape } from './ridge-path';

const durationMs = 160;
const easeOut = (share: number): number => 1 - (1 - share) ** 3;

/** Moves the hill to its new place in 160 ms; at once on the first drawing, on resize, and for readers who ask for stillness. */
export const useAnimatedRidge = (target: RidgeShape | null, placeKey: string): RidgeShape | null => {
  const still = useReducedMotion();
  const [moving, setMoving] = useState<RidgeShape | null>(null);
  const shown = useRef<RidgeShape | null>(null);
  const place = useRef(placeKey);

  useEffect(() => {
    const from = shown.current;
    const moves = from !== null && target !== null && place.current !== placeKey && !still;
    place.current = placeKey;
    if (!moves) {
      shown.current = target;
      setMoving(null);
      return undefined;
    }
    const begunAt = performance.now();
    let frame = 0;
    const step = (now: number): void => {
      const share = Math.min(1, Math.max(0, (now - begunAt) / durationMs));
      const next = share === 1 ? target : betweenRidges(from, target, easeOut(share));
      shown.current = next;
      setMoving(share === 1 ? null : next);
      if (share < 1) frame = requestAnimationFrame(step);
    };
    frame = requestAnimationFrame(step);
    return () => cancelAnimationFrame(frame);
    // The shape's numbers, not its identity, decide whether it moved.
    // eslint-disable-next-line react-hooks/exhaustive-deps -- see the line above
  }, [placeKey, still, target?.width, target?.leftFoot, target?.rightFoot, target?.rise]);

  return moving ?? target;
};
