/** Tilt of a notehead, degrees, counter-clockwise. */
const TILT = -20;
/** Height of a notehead in widths. */
const NOTEHEAD_RATIO = 7.4 / 10.4;

/** A tilted ellipse around (x, y), as a path. */
export function noteheadPath(x: number, y: number, width: number): string {
  const rx = width / 2;
  const ry = rx * NOTEHEAD_RATIO;
  const angle = (TILT * Math.PI) / 180;
  const dx = rx * Math.cos(angle);
  const dy = rx * Math.sin(angle);
  const f = (value: number) => value.toFixed(2);
  const arc = `A${f(rx)} ${f(ry)} ${TILT} 1 1`;
  return `M${f(x - dx)} ${f(y - dy)}${arc} ${f(x + dx)} ${f(y + dy)}${arc} ${f(x - dx)} ${f(y - dy)}Z`;
}
