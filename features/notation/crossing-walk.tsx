import type { KeyboardEvent, MouseEvent, ReactNode } from 'react';

export interface CrossingWalkProps {
  /** The picture's text alternative. */
  name: string;
  count: number;
  selected: number | null;
  onSelect: (crossing: number) => void;
  /** What is said of a crossing. */
  valueText: (crossing: number) => string;
  onPress?: (event: MouseEvent<HTMLElement>) => void;
  children: ReactNode;
}

function nextCrossing(key: string, at: number | null, count: number): number | null {
  switch (key) {
    case 'ArrowRight':
    case 'ArrowUp':
      return at === null ? 0 : (at + 1) % count;
    case 'ArrowLeft':
    case 'ArrowDown':
      return at === null ? count - 1 : (at - 1 + count) % count;
    case 'Home':
      return 0;
    case 'End':
      return count - 1;
    default:
      return null;
  }
}

/** A picture in which one crossing can be selected: arrow keys walk the crossings in time, a press takes the nearest. */
export function CrossingWalk(props: CrossingWalkProps) {
  const { name, count, selected, onSelect, valueText, onPress, children } = props;
  const onKeyDown = (event: KeyboardEvent) => {
    const next = nextCrossing(event.key, selected, count);
    if (next === null || count === 0) return;
    event.preventDefault();
    onSelect(next);
  };
  return (
    <div
      role="slider"
      tabIndex={0}
      aria-label={name}
      aria-valuemin={1}
      aria-valuemax={count}
      aria-valuenow={(selected ?? 0) + 1}
      aria-valuetext={selected === null ? 'no crossing selected' : valueText(selected)}
      onKeyDown={onKeyDown}
      {...(onPress && { onClick: onPress })}
    >
      {children}
    </div>
  );
}
