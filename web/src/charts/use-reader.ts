import { localPoint } from '@visx/event';
import { useRef, useState, type KeyboardEvent, type PointerEvent } from 'react';
import type { TrendPoint } from '@slighthill/shared/contracts/trend';
import { nearestMark, readerKey } from './reader-keys';
import type { DrawnMark } from './trend-layout';

/** Where the reader stands, and what keys and pointers do to it. */
export const useReader = (marks: readonly DrawnMark[], onOpenPoint: (point: TrendPoint) => void) => {
  const [index, setIndex] = useState<number | null>(null);
  const [byKey, setByKey] = useState(false);
  const pointerKind = useRef('');
  const read = index === null ? null : (marks[Math.min(index, marks.length - 1)] ?? null);

  const onKeyDown = (event: KeyboardEvent): void => {
    if (event.key === 'Enter' && read) {
      event.preventDefault();
      onOpenPoint(read.point);
      return;
    }
    const next = readerKey(event.key, index, marks.length);
    if (next === undefined) return;
    event.preventDefault();
    setByKey(true);
    setIndex(next);
  };

  const onPointer = (event: PointerEvent<HTMLDivElement>): void => {
    const at = localPoint(event.currentTarget, event);
    if (!at) return;
    pointerKind.current = event.pointerType;
    setByKey(false);
    setIndex(nearestMark(marks, at));
  };

  return {
    read,
    /** What a key reached is announced; what a pointer passes over is not. */
    announces: byKey,
    handlers: {
      onKeyDown,
      onPointerMove: onPointer,
      onPointerDown: onPointer,
      onPointerLeave: (event: PointerEvent) => event.pointerType === 'mouse' && setIndex(null),
      onBlur: () => setIndex(null),
      // A finger reads first: only a mouse opens the test it points at.
      onClick: () => read && pointerKind.current === 'mouse' && onOpenPoint(read.point),
    },
  };
};
