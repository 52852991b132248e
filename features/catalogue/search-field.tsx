import { useRef } from 'react';
import { View } from 'react-native';
import { describeTerm } from '@/features/catalogue/describe-term';
import { removeTerm } from '@/features/catalogue/edit-search-line';
import type { SearchLine } from '@/features/catalogue/use-search-line';
import { Chip, Field, Text, TextButton, colour, space, useAnnounce, useLayout, usePageKeys } from '@/features/ui';

const STICKING = { position: 'sticky', top: 0, zIndex: 15, background: colour.page } as const;
/** The cross is small, what one touches is not. */
const CLEAR = {
  width: 44,
  height: 44,
  margin: '-8px -12px -8px 0',
  border: 0,
  background: 'none',
  color: colour.muted,
  font: 'inherit',
  cursor: 'pointer',
} as const;

interface SearchFieldProps {
  line: SearchLine;
  /** Enter was pressed. */
  onEnter: () => void;
  /** Shown at the right of the field while it sticks on a phone. */
  count: string | null;
}

/** The search line; it sticks at the top of a phone. */
export function SearchField({ line, onEnter, count }: SearchFieldProps) {
  const field = useRef<HTMLInputElement>(null);
  const layout = useLayout();
  const phone = layout === 'phone';
  usePageKeys({
    '/': () => {
      field.current?.focus();
      field.current?.select();
    },
  });
  return (
    <>
      <div role="search" style={phone ? STICKING : undefined}>
        <Field
          label="Search the catalogue"
          hideLabel
          type="search"
          large={!phone}
          placeholder="system, number, point or words"
          value={line.text}
          onChangeText={line.setText}
          inputRef={field}
          onKeyDown={(event) => {
            if (event.key === 'Enter') onEnter();
            if (event.key === 'Escape') event.currentTarget.blur();
          }}
          trailing={<Trailing line={line} layout={layout} count={count} />}
        />
      </div>
      <Chips line={line} onEdit={(start, end) => selectIn(field.current, start, end)} />
    </>
  );
}

function selectIn(field: HTMLInputElement | null, start: number, end: number): void {
  field?.focus();
  field?.setSelectionRange(start, end);
}

function Trailing({ line, layout, count }: { line: SearchLine; layout: string; count: string | null }) {
  if (layout === 'wide') {
    return (
      <Text size={14} tone="muted">
        press / to come back here
      </Text>
    );
  }
  if (line.text === '') return null;
  return (
    <View style={{ flexDirection: 'row', alignItems: 'baseline', gap: space.oneHalf }}>
      {count ? (
        <Text size={13} mono tone="muted">
          {count}
        </Text>
      ) : null}
      <button type="button" style={CLEAR} aria-label="Clear the search" onClick={() => line.setText('')}>
        ×
      </button>
    </View>
  );
}

function Chips({ line, onEdit }: { line: SearchLine; onEdit: (start: number, end: number) => void }) {
  const announce = useAnnounce();
  const wide = useLayout() === 'wide';
  if (line.terms.length === 0) return null;
  return (
    <View
      role="group"
      aria-label="Understood as"
      style={{ flexDirection: 'row', flexWrap: 'wrap', alignItems: 'center', columnGap: space.one }}
    >
      {wide ? <Text tone="muted">Understood as</Text> : null}
      {line.terms.map((term) => {
        const { name, value, mono } = describeTerm(term);
        return (
          <Chip
            key={`${term.kind} ${term.start}`}
            name={name}
            value={term.kind === 'system' ? <Text italic>{value}</Text> : value}
            valueText={value}
            mono={mono}
            kind={term.kind === 'words' ? 'words' : 'filter'}
            onEdit={() => onEdit(term.start, term.end)}
            onRemove={() => {
              line.setText(removeTerm(line.text, term));
              announce(`${name} removed`);
            }}
          />
        );
      })}
      {wide ? <TextButton onPress={() => line.setText('')}>Clear</TextButton> : null}
    </View>
  );
}
