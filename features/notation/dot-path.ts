/** A round dot as a path, so that many dots are one element. */
export function dotPath(x: number, y: number, radius: number): string {
  const f = (value: number) => value.toFixed(2);
  const r = f(radius);
  return `M${f(x - radius)} ${f(y)}a${r} ${r} 0 1 0 ${f(2 * radius)} 0a${r} ${r} 0 1 0 ${f(-2 * radius)} 0Z`;
}
