import type { KeyboardEvent } from 'react';
import { TextButton } from '@/features/ui';
import { type Turn, TURN_STEP, turned, unturned } from './turn';

export interface TurnControlProps {
  turn: Turn;
  onTurn: (turn: Turn) => void;
}

const STEPS: Record<string, [number, number]> = {
  ArrowLeft: [-TURN_STEP, 0],
  ArrowRight: [TURN_STEP, 0],
  ArrowUp: [0, TURN_STEP],
  ArrowDown: [0, -TURN_STEP],
};

/** Turns a projection by the arrow keys, 5° a press; for the keyboard what dragging is for a pointer. */
export function TurnControl({ turn, onTurn }: TurnControlProps) {
  const onKeyDown = (event: KeyboardEvent) => {
    const step = STEPS[event.key];
    if (!step) return;
    event.preventDefault();
    onTurn(turned(turn, step[0], step[1]));
  };
  const isTurned = turn.yaw !== 0 || turn.pitch !== 0;
  return (
    <span className="r-turn r-noprint">
      <span
        role="slider"
        tabIndex={0}
        className="r-reading r-small"
        aria-label="Turn the projection"
        aria-valuemin={-360}
        aria-valuemax={360}
        aria-valuenow={turn.yaw}
        aria-valuetext={`turned ${turn.yaw}°, tipped ${turn.pitch}°`}
        onKeyDown={onKeyDown}
      >
        drag or arrow keys turn it
      </span>{' '}
      {isTurned ? (
        <TextButton size={14} onPress={() => onTurn(unturned)}>
          Reset
        </TextButton>
      ) : null}
    </span>
  );
}
