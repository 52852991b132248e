/** How far a projection is turned, degrees: around the upright axis, then tipped towards the viewer. */
export interface Turn {
  yaw: number;
  pitch: number;
}

export const unturned: Turn = { yaw: 0, pitch: 0 };

/** One press of an arrow key, degrees. */
export const TURN_STEP = 5;

/** Tipping further would show the picture upside down. */
const MOST_PITCH = 90;

export function turned({ yaw, pitch }: Turn, dx: number, dy: number): Turn {
  return { yaw: (yaw + dx) % 360, pitch: Math.max(-MOST_PITCH, Math.min(MOST_PITCH, pitch + dy)) };
}

/** Coordinates [right, up, away] as seen after a turn: [right, up]. */
export function seenFrom({ yaw, pitch }: Turn, [right, up, away]: readonly [number, number, number]): [number, number] {
  const [a, b] = [(yaw * Math.PI) / 180, (pitch * Math.PI) / 180];
  const across = right * Math.cos(a) + away * Math.sin(a);
  const depth = away * Math.cos(a) - right * Math.sin(a);
  return [across, up * Math.cos(b) + depth * Math.sin(b)];
}
