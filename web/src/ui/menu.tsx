import { DropdownMenu as Primitive } from 'radix-ui';
import type { ReactNode } from 'react';
import { Icon, type IconName } from './icon';
import { useOverlayRoot } from './overlay-root';

export interface MenuItem {
  label: string;
  icon?: IconName;
  /** A second, softer line. */
  note?: string;
  onSelect: () => void;
}

interface MenuProps {
  /** One button; it opens the menu. */
  trigger: ReactNode;
  items: readonly MenuItem[];
  /** Lines above the items that are not choices, such as whose menu this is. */
  heading?: ReactNode;
}

export const Menu = ({ trigger, items, heading }: MenuProps) => {
  const container = useOverlayRoot();
  return (
    <Primitive.Root modal={false}>
      <Primitive.Trigger asChild>{trigger}</Primitive.Trigger>
      <Primitive.Portal container={container}>
        <Primitive.Content
          align="end"
          sideOffset={6}
          collisionPadding={12}
          className="z-50 min-w-52 animate-[appear_120ms_ease-out] rounded-sheet border border-line bg-surface p-1.5 shadow-reader"
        >
          {heading && <div className="border-b border-row px-3 pt-1.5 pb-2.5">{heading}</div>}
          {items.map((item) => (
            <Primitive.Item
              key={item.label}
              onSelect={item.onSelect}
              className="flex min-h-9 cursor-pointer items-center gap-3 rounded-cell px-3 text-body outline-none data-highlighted:bg-tarn-wash data-highlighted:text-tarn-deep"
            >
              {item.icon && <Icon name={item.icon} size={18} className="text-tarn" />}
              <span>
                {item.label}
                {item.note && <span className="block text-note text-ink-soft">{item.note}</span>}
              </span>
            </Primitive.Item>
          ))}
        </Primitive.Content>
      </Primitive.Portal>
    </Primitive.Root>
  );
};
