import { type PointerEvent, type ReactNode, useRef } from 'react';
import { type Turn, turned } from './turn';

export interface TurnByDragProps {
  turn: Turn;
  onTurn: (turn: Turn) => void;
  children: ReactNode;
}

/** Degrees for a pixel of dragging. */
const DEGREES = 0.5;
/** A press that moves less than this is a press, px. */
const STILL = 4;

/** Dragging sideways turns what is inside; on a touch screen, up and down still scroll the page. */
export function TurnByDrag({ turn, onTurn, children }: TurnByDragProps) {
  const start = useRef<{ x: number; y: number; turn: Turn; moved: boolean } | null>(null);
  const onPointerDown = (event: PointerEvent) => {
    start.current = { x: event.clientX, y: event.clientY, turn, moved: false };
  };
  const onPointerMove = (event: PointerEvent<HTMLElement>) => {
    const from = start.current;
    if (!from || event.buttons === 0) return;
    const [dx, dy] = [event.clientX - from.x, event.clientY - from.y];
    if (!from.moved && Math.hypot(dx, dy) < STILL) return;
    if (!from.moved) event.currentTarget.setPointerCapture(event.pointerId);
    from.moved = true;
    const tip = event.pointerType === 'touch' ? 0 : dy;
    onTurn(turned(from.turn, Math.round(dx * DEGREES), Math.round(tip * DEGREES)));
  };
  return (
    <div
      role="presentation"
      style={{ touchAction: 'pan-y', cursor: 'grab' }}
      onPointerDown={onPointerDown}
      onPointerMove={onPointerMove}
      onClickCapture={(event) => {
        if (start.current?.moved) event.stopPropagation();
        start.current = null;
      }}
    >
      {children}
    </div>
  );
}
