import { useEffect, useEffectEvent } from 'react';

const isTyping = (target: EventTarget | null): boolean =>
  target instanceof HTMLElement && (target.isContentEditable || /^(INPUT|TEXTAREA|SELECT)$/.test(target.tagName));

/** One plain key, at rest while someone types, while a dialog is open, or when a modifier is held. */
export const useHotkey = (key: string, onPress: () => void, enabled = true): void => {
  const press = useEffectEvent(onPress);
  useEffect(() => {
    if (!enabled) return undefined;
    const listen = (event: KeyboardEvent): void => {
      if (event.key !== key || event.defaultPrevented || event.ctrlKey || event.metaKey || event.altKey) return;
      if (isTyping(event.target) || document.querySelector('[role="dialog"],[role="alertdialog"]')) return;
      event.preventDefault();
      press();
    };
    document.addEventListener('keydown', listen);
    return () => document.removeEventListener('keydown', listen);
  }, [key, enabled]);
};
