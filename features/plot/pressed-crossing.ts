import type { MouseEvent } from 'react';

/** How far from a mark a press still takes it unless said otherwise, px. */
const REACH = 32;

/** The mark nearest to a press, if one is near enough. */
export function pressedCrossing(
  event: MouseEvent<HTMLElement>,
  marks: readonly { x: number; y: number }[],
  within = REACH,
): number | null {
  const box = event.currentTarget.getBoundingClientRect();
  const [x, y] = [event.clientX - box.left, event.clientY - box.top];
  let nearest: number | null = null;
  let reach = within;
  marks.forEach((mark, index) => {
    const distance = Math.hypot(mark.x - x, mark.y - y);
    if (distance < reach) {
      reach = distance;
      nearest = index;
    }
  });
  return nearest;
}
