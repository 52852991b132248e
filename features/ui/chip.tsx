import type { ReactNode } from 'react';

export interface ChipProps {
  /** What it restricts: "returns". */
  name: string;
  /** The value as drawn: "9". */
  value: ReactNode;
  /** The value in words, for the accessible name; needed when `value` is not a string. */
  valueText?: string;
  /** The value is a number or a code: Iosevka. */
  mono?: boolean;
  /** Solid edge: a filter. Dashed edge: searched as plain words. */
  kind?: 'filter' | 'words';
  onEdit?: () => void;
  onRemove: () => void;
}

/** One thing that a search understood: tap the words to edit, the cross to remove. */
export function Chip({ name, value, valueText, mono, kind = 'filter', onEdit, onRemove }: ChipProps) {
  const said = `${name} ${valueText ?? (typeof value === 'string' ? value : '')}`.trim();
  const words = (
    <>
      {name} <b className={mono ? 'r-mono' : undefined}>{value}</b>
    </>
  );
  return (
    <span className={kind === 'words' ? 'r-chip r-words' : 'r-chip'}>
      {onEdit ? (
        <button type="button" onClick={onEdit} aria-label={`Edit ${said}`}>
          {words}
        </button>
      ) : (
        <span className="r-chip-words">{words}</span>
      )}
      <button type="button" className="r-remove" onClick={onRemove} aria-label={`Remove ${said}`}>
        ×
      </button>
    </span>
  );
}
