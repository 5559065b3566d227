import { useRef } from 'react';
import { useHotkey } from '../../lib/use-hotkey';
import { Icon } from '../../ui/icon';
import { Key } from '../../ui/key';

interface SearchBoxProps {
  value: string;
  onValueChange: (value: string) => void;
  /** Down leaves the box for the first row. */
  onLeaveDown: () => void;
}

export const SearchBox = ({ value, onValueChange, onLeaveDown }: SearchBoxProps) => {
  const input = useRef<HTMLInputElement>(null);
  useHotkey('/', () => input.current?.focus());
  return (
    <div
      role="search"
      className="flex min-h-9.5 w-full items-center gap-2 rounded-control border border-edge bg-surface pl-3 focus-within:outline-3 focus-within:outline-offset-2 focus-within:outline-tarn row:w-84"
    >
      <Icon name="search" size={18} className="text-ink-soft" />
      <input
        ref={input}
        type="search"
        aria-label="Find a patient"
        aria-keyshortcuts="/"
        placeholder="Name, record number or birth date"
        autoComplete="off"
        spellCheck={false}
        value={value}
        onChange={(event) => onValueChange(event.target.value)}
        onKeyDown={(event) => {
          if (event.key === 'Escape' && value !== '') onValueChange('');
          if (event.key === 'ArrowDown') {
            event.preventDefault();
            onLeaveDown();
          }
        }}
        className="min-w-0 flex-1 bg-transparent py-1.5 outline-none [&::-webkit-search-cancel-button]:hidden"
      />
      <span className="hidden pr-2 row:block">
        <Key>/</Key>
      </span>
    </div>
  );
};
