const UNITS = ['bytes', 'kB', 'MB', 'GB'] as const;
const STEP = 1000;

/** A size of a file: "812 bytes", "3.4 MB". */
export function fileSize(bytes: number): string {
  const power = bytes < STEP ? 0 : Math.min(UNITS.length - 1, Math.floor(Math.log10(bytes) / Math.log10(STEP)));
  const size = bytes / STEP ** power;
  return `${power === 0 || size >= 100 ? Math.round(size) : size.toPrecision(2)} ${UNITS[power]}`;
}
