import { type KeyboardEvent, type ReactNode, useEffect, useRef } from 'react';
import { followLink } from './follow-link';
import { Popover, type PopoverProps } from './popover';

export interface MenuItem {
  key: string;
  label: ReactNode;
  detail?: ReactNode;
  onSelect?: () => void;
  href?: string;
  download?: string;
  disabledBecause?: string | null;
}

export interface MenuProps extends Omit<PopoverProps, 'children' | 'role'> {
  items: readonly MenuItem[];
}

function moveFocus(event: KeyboardEvent<HTMLElement>): void {
  const items = [...event.currentTarget.querySelectorAll<HTMLElement>('[role="menuitem"]')];
  const at = items.findIndex((item) => item === document.activeElement);
  const step = { ArrowDown: at + 1, ArrowUp: at < 0 ? items.length - 1 : at - 1, Home: 0, End: items.length - 1 }[
    event.key
  ];
  if (step === undefined) return;
  event.preventDefault();
  items[(step + items.length) % items.length]?.focus();
}

function Item({ item, close }: { item: MenuItem; close: () => void }) {
  const inside = (
    <>
      <span>{item.label}</span>
      {item.detail ? <small>{item.detail}</small> : null}
    </>
  );
  if (item.href !== undefined && !item.disabledBecause) {
    const { href } = item;
    return (
      <a
        role="menuitem"
        className="r-item"
        href={href}
        {...(item.download !== undefined && { download: item.download })}
        onClick={(event) => {
          close();
          item.onSelect?.();
          followLink(event, href);
        }}
      >
        {inside}
      </a>
    );
  }
  return (
    <button
      type="button"
      role="menuitem"
      className="r-item"
      {...(item.disabledBecause && { 'aria-disabled': true, title: item.disabledBecause })}
      onClick={() => {
        if (item.disabledBecause) return;
        close();
        item.onSelect?.();
      }}
    >
      {inside}
    </button>
  );
}

function Items({ items, close }: { items: readonly MenuItem[]; close: () => void }) {
  const list = useRef<HTMLDivElement>(null);
  useEffect(() => list.current?.querySelector<HTMLElement>('[role="menuitem"]')?.focus(), []);
  return (
    <div ref={list} role="presentation" onKeyDown={moveFocus}>
      {items.map((item) => (
        <Item key={item.key} item={item} close={close} />
      ))}
    </div>
  );
}

/** A button with a list of things to do; arrow keys, Home, End and Escape work. */
export function Menu({ items, ...rest }: MenuProps) {
  return (
    <Popover {...rest} role="menu">
      {(close) => <Items items={items} close={close} />}
    </Popover>
  );
}
