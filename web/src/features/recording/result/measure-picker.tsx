import { measureGroups, type MeasureGroup, type MeasureId } from '@slighthill/shared/measures';
import { useEffect, useId, useMemo, useRef, useState, type KeyboardEvent, type Ref } from 'react';
import { cx } from '../../../ui/cx';
import { TextInput } from '../../../ui/text-input';
import { enterableMeasures } from './result-form';
import { unitBeside } from './unit-beside';

interface MeasurePickerProps {
  value: string;
  onChoose: (measure: MeasureId) => void;
  ref?: Ref<HTMLInputElement>;
}

const groupLabels: Record<MeasureGroup, string> = {
  spirometry: 'Spirometry',
  'lung-volumes': 'Lung volumes',
  'transfer-factor': 'Transfer factor',
  exercise: 'Exercise',
  breathlessness: 'Breathlessness',
  'quality-of-life': 'Quality of life',
  mood: 'Mood',
  body: 'Body',
};

const labelOf = (id: string): string => enterableMeasures.find((measure) => measure.id === id)?.label ?? '';

/** Every typed word must begin or lie in a name: "6 walk" finds the 6-minute walk. */
export const findMeasures = (search: string) => {
  const words = search.toLowerCase().split(/\s+/).filter(Boolean);
  const matches = enterableMeasures.filter(({ label, shortLabel, group }) => {
    const text = `${label} ${shortLabel} ${groupLabels[group]}`.toLowerCase();
    return words.every((word) => text.includes(word));
  });
  return measureGroups.flatMap((group) => {
    const measures = matches.filter((measure) => measure.group === group);
    return measures.length > 0 ? [{ group, label: groupLabels[group], measures }] : [];
  });
};

/** Chooses by typing a part of the name or with the arrows; Enter takes the marked one. */
export const MeasurePicker = ({ value, onChoose, ref }: MeasurePickerProps) => {
  const listId = useId();
  const [search, setSearch] = useState<string | null>(null);
  const [marked, setMarked] = useState(0);
  const list = useRef<HTMLDivElement>(null);
  const open = search !== null;
  const groups = useMemo(() => findMeasures(search ?? ''), [search]);
  const flat = groups.flatMap(({ measures }) => measures);
  const current = flat[Math.min(marked, flat.length - 1)];
  const optionId = (id: string): string => `${listId}-${id}`;

  const choose = (id: MeasureId): void => {
    setSearch(null);
    onChoose(id);
  };

  const mark = (next: number): void => {
    const index = (next + flat.length) % Math.max(1, flat.length);
    setMarked(index);
    const option = flat[index];
    if (option) list.current?.querySelector(`[data-measure="${option.id}"]`)?.scrollIntoView({ block: 'nearest' });
  };

  useEffect(() => {
    if (!open) return undefined;
    // Escape closes the list and not the drawer, which listens on the document: the window hears it first.
    const closeList = (event: globalThis.KeyboardEvent): void => {
      if (event.key !== 'Escape') return;
      event.stopPropagation();
      event.preventDefault();
      setSearch(null);
    };
    window.addEventListener('keydown', closeList, { capture: true });
    return () => window.removeEventListener('keydown', closeList, { capture: true });
  }, [open]);

  const press = (event: KeyboardEvent): void => {
    if (event.key === 'ArrowDown' || event.key === 'ArrowUp') {
      event.preventDefault();
      if (!open) return setSearch('');
      return mark(marked + (event.key === 'ArrowDown' ? 1 : -1));
    }
    if (event.key === 'Enter' && open) {
      event.preventDefault();
      if (current) choose(current.id);
    }
  };

  return (
    <div className="relative">
      <TextInput
        ref={ref}
        role="combobox"
        aria-expanded={open}
        aria-controls={listId}
        aria-autocomplete="list"
        aria-activedescendant={open && current ? optionId(current.id) : undefined}
        autoComplete="off"
        spellCheck={false}
        placeholder="Walk, CAT, TLC"
        value={search ?? labelOf(value)}
        onChange={(event) => {
          setSearch(event.target.value);
          setMarked(0);
        }}
        onFocus={(event) => event.target.select()}
        onClick={() => setSearch((typedText) => typedText ?? '')}
        onBlur={() => setSearch(null)}
        onKeyDown={press}
      />
      <div
        ref={list}
        id={listId}
        role="listbox"
        aria-label="Results that can be recorded"
        hidden={!open}
        className="absolute z-10 mt-1 max-h-80 w-full overflow-y-auto rounded-sheet border border-line bg-surface p-1.5 shadow-reader"
      >
        {groups.map(({ group, label, measures }) => (
          <div key={group} role="group" aria-labelledby={`${listId}-${group}`}>
            <p id={`${listId}-${group}`} role="presentation" className="px-3 pt-2 pb-1 text-head text-ink-soft">
              {label}
            </p>
            {measures.map((measure) => (
              <div
                key={measure.id}
                id={optionId(measure.id)}
                data-measure={measure.id}
                role="option"
                aria-selected={measure.id === current?.id}
                // Down, not click: the field must not lose the focus first.
                onMouseDown={(event) => {
                  event.preventDefault();
                  choose(measure.id);
                }}
                className={cx(
                  'flex min-h-8 cursor-pointer items-center justify-between gap-3 rounded-cell px-3',
                  measure.id === current?.id ? 'bg-tarn-wash text-tarn-deep' : 'hover:bg-mist',
                )}
              >
                <span>{measure.label}</span>
                <span className="text-note text-ink-soft">{measure.unit.symbol && unitBeside(measure)}</span>
              </div>
            ))}
          </div>
        ))}
        {open && flat.length === 0 && <p className="px-3 py-2 text-ink-soft">No result has this name.</p>}
      </div>
    </div>
  );
};
