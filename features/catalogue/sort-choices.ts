/** Orders of a result, by their names in the API. */
const sortChoices = [
  { value: 'period', label: 'period, rising' },
  { value: '-period', label: 'period, falling' },
  { value: 'returns', label: 'returns, rising' },
  { value: '-returns', label: 'returns, falling' },
  { value: 'multiplier', label: '|μ|, rising' },
  { value: '-multiplier', label: '|μ|, falling' },
  { value: 'newest', label: 'newest first' },
  { value: 'oldest', label: 'oldest first' },
  { value: 'accession', label: 'accession' },
] as const;

const byDistance = { value: 'distance', label: 'distance' } as const;

export const sortChoicesFor = (hasPoint: boolean) => (hasPoint ? [byDistance, ...sortChoices] : [...sortChoices]);

/** The order the server takes when none is asked for. */
export function defaultSort(filter: { system?: string; near?: string }): string {
  if (filter.near !== undefined) return 'distance';
  return filter.system === undefined ? 'newest' : 'period';
}

export const sortLabel = (value: string): string =>
  [byDistance, ...sortChoices].find((choice) => choice.value === value)?.label ?? value;
