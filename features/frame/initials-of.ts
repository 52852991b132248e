/** First letters of the first and last part of a name: "DC". */
export function initialsOf(name: string): string {
  const parts = name.trim().split(/\s+/);
  const ends = parts.length > 1 ? [parts[0], parts.at(-1)] : [parts[0]];
  return ends.map((part) => Array.from(part ?? '')[0]?.toUpperCase() ?? '').join('');
}
