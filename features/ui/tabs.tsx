import { type KeyboardEvent, type ReactNode, useId, useRef } from 'react';

export interface Tab<Key extends string> {
  key: Key;
  label: ReactNode;
  /** Shown after the label. */
  count?: number;
}

export interface TabsProps<Key extends string> {
  /** What the tabs choose between, for a screen reader. */
  name: string;
  tabs: readonly Tab<Key>[];
  active: Key;
  onChange: (key: Key) => void;
  /** The panel of the active tab. */
  children: ReactNode;
}

function nextIndex(key: string, at: number, count: number): number | null {
  switch (key) {
    case 'ArrowRight':
      return (at + 1) % count;
    case 'ArrowLeft':
      return (at - 1 + count) % count;
    case 'Home':
      return 0;
    case 'End':
      return count - 1;
    default:
      return null;
  }
}

/** Tabs with their panel; left and right walk them. */
export function Tabs<Key extends string>({ name, tabs, active, onChange, children }: TabsProps<Key>) {
  const id = useId();
  const list = useRef<HTMLDivElement>(null);
  const onKeyDown = (event: KeyboardEvent) => {
    const next = nextIndex(
      event.key,
      tabs.findIndex((tab) => tab.key === active),
      tabs.length,
    );
    const tab = next === null ? undefined : tabs[next];
    if (!tab || next === null) return;
    event.preventDefault();
    onChange(tab.key);
    list.current?.querySelectorAll<HTMLElement>('[role="tab"]')[next]?.focus();
  };
  return (
    <div>
      <div ref={list} className="r-tabs r-noprint" role="tablist" aria-label={name} tabIndex={-1} onKeyDown={onKeyDown}>
        {tabs.map((tab) => (
          <button
            key={tab.key}
            type="button"
            role="tab"
            id={`${id}-${tab.key}`}
            className="r-tab"
            aria-selected={tab.key === active}
            aria-controls={`${id}-panel`}
            tabIndex={tab.key === active ? 0 : -1}
            onClick={() => onChange(tab.key)}
          >
            {tab.label}
            {tab.count === undefined ? null : <span className="r-tab-count"> {tab.count}</span>}
          </button>
        ))}
      </div>
      <div role="tabpanel" id={`${id}-panel`} aria-labelledby={`${id}-${active}`}>
        {children}
      </div>
    </div>
  );
}
