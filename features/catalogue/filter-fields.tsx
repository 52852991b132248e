import type { ReactNode } from 'react';
import { View } from 'react-native';
import { DraftField } from '@/features/catalogue/draft-field';
import { replaceTerm } from '@/features/catalogue/edit-search-line';
import { type FilterValues, filterValues } from '@/features/catalogue/filter-values';
import { PointField } from '@/features/catalogue/point-field';
import type { PeriodSlices } from '@/features/catalogue/use-period-slices';
import { PeriodRange } from '@/features/notation/period-range';
import { EVIDENCE_LEVELS, type SearchTerm, type TermKind } from '@/features/catalogue/search-term';
import { StabilityField } from '@/features/catalogue/stability-field';
import { Italic } from '@/features/catalogue/italic';
import { colour, RadioGroup, Select, space, Text } from '@/features/ui';

export interface FilterFieldsProps {
  text: string;
  terms: readonly SearchTerm[];
  onText: (text: string) => void;
  /** One below the other with rules, or packed for a sheet or a row. */
  shape: 'column' | 'sheet' | 'row';
  /** Names of the chosen system's variables. */
  variables: readonly string[] | null;
  /** How the periods are spread, where that is known. */
  periods: PeriodSlices | null;
}

const POSITIVE = /^(?:\d+(?:\.\d*)?|\.\d+)$/;
const WHOLE = /^[1-9]\d{0,3}$/;
const LETTERS = /^[A-Za-z0-9]+$/;

const EVIDENCE_CHOICES = EVIDENCE_LEVELS.map((value: string) => ({ value, label: value }));

/** Words for a range of periods, as the search line reads them. */
function periodWords(from: string, to: string): string {
  if (from && to) return `${from} to ${to}`;
  if (from) return `period from ${from}`;
  return to ? `period up to ${to}` : '';
}

function returnsWords(from: string, to: string): string {
  const [min, max] = [from || to, to || from];
  if (!min) return '';
  return min === max ? `${min} ${min === '1' ? 'return' : 'returns'}` : `${min} to ${max} returns`;
}

/** Filters that write into the search line, so that both always say the same. */
export function FilterFields({ text, terms, onText, shape, variables, periods }: FilterFieldsProps) {
  const values = filterValues(terms);
  const write = (kinds: readonly TermKind[], words: string) => onText(replaceTerm(text, terms, { kinds, words }));
  const title = (words: ReactNode) => (shape === 'column' ? <Text weight="semibold">{words}</Text> : words);
  const parts = { shape, values, title, write };
  return (
    <View style={shape === 'row' ? ROW : { gap: shape === 'column' ? 0 : space.two }}>
      <Ranges {...parts} periods={periods} />
      <Group shape={shape}>
        <DraftField
          label={title('Itinerary contains')}
          showLabel
          letters
          placeholder="such as AAB"
          value={values.contains}
          form={LETTERS}
          wrong="letters of the itinerary"
          onCommit={(v) => write(['contains'], v && `contains ${v}`)}
        />
      </Group>
      <Classes {...parts} />
      <Group shape={shape}>
        <PointField
          title={title}
          value={values.near}
          variables={variables}
          onCommit={(v) => write(['near'], v && `near ${v}`)}
        />
      </Group>
    </View>
  );
}

interface PartProps {
  shape: FilterFieldsProps['shape'];
  values: FilterValues;
  title: (words: ReactNode) => ReactNode;
  write: (kinds: readonly TermKind[], words: string) => void;
}

/** Period and returns. */
function Ranges({ shape, values, title, write, periods }: PartProps & Pick<FilterFieldsProps, 'periods'>) {
  return (
    <>
      <Group shape={shape}>
        <Range
          legend={title(
            <>
              Period <Italic>T</Italic>
            </>,
          )}
          names={['Shortest period', 'Longest period']}
          values={[values.periodFrom, values.periodTo]}
          form={POSITIVE}
          wrong="a positive number"
          picture={
            periods && shape !== 'row' ? (
              <PeriodRange
                {...periods}
                from={values.periodFrom}
                to={values.periodTo}
                onChange={(from, to) => write(['period', 'period-range'], periodWords(from, to))}
              />
            ) : null
          }
          hint={values.rounded ? `all that round to ${values.rounded}` : null}
          onCommit={(from, to) => write(['period', 'period-range'], periodWords(from, to))}
        />
      </Group>
      <Group shape={shape}>
        <Range
          legend={title('Returns')}
          names={['Fewest returns', 'Most returns']}
          values={[values.returnsFrom, values.returnsTo]}
          form={WHOLE}
          wrong="a whole number"
          onCommit={(from, to) => write(['returns'], returnsWords(from, to))}
        />
      </Group>
    </>
  );
}

/** Stability and evidence. */
function Classes({ shape, values, title, write }: PartProps) {
  const choose = (level: string) => write(['evidence'], level === EVIDENCE_LEVELS[0] ? '' : level);
  return (
    <>
      <Group shape={shape}>
        <StabilityField
          legend={title('Stability')}
          shape={shape}
          values={values.stability}
          onChange={(v) => write(['stability'], v.join(' or '))}
        />
      </Group>
      <Group shape={shape}>
        {shape === 'row' ? (
          <Select label="Evidence, at least" value={values.evidence} options={EVIDENCE_CHOICES} onChange={choose} />
        ) : (
          <RadioGroup
            legend={title('Evidence, at least')}
            kind={shape === 'column' ? 'inline' : 'segments'}
            value={values.evidence}
            options={EVIDENCE_CHOICES}
            onChange={choose}
          />
        )}
      </Group>
    </>
  );
}

/** In a column a hairline stands over every filter. */
function Group({ shape, children }: { shape: FilterFieldsProps['shape']; children: ReactNode }) {
  if (shape === 'sheet') return <>{children}</>;
  if (shape === 'row') return <View style={{ flexGrow: 1, flexBasis: 208, minWidth: 0 }}>{children}</View>;
  return (
    <View style={{ borderTopWidth: 1, borderColor: colour.hairline, paddingTop: space.one, paddingBottom: space.two }}>
      {children}
    </View>
  );
}

const ROW = {
  flexDirection: 'row',
  flexWrap: 'wrap',
  columnGap: space.three,
  rowGap: space.one,
  alignItems: 'flex-start',
} as const;

interface RangeProps {
  legend: ReactNode;
  names: readonly [string, string];
  values: readonly [string, string];
  form: RegExp;
  wrong: string;
  /** Above the fields. */
  picture?: ReactNode;
  hint?: string | null;
  onCommit: (from: string, to: string) => void;
}

/** Two fields that make a range. */
function Range({ legend, names, values, form, wrong, picture, hint, onCommit }: RangeProps) {
  const [from, to] = values;
  return (
    <fieldset className="r-group">
      <legend className="r-label">{legend}</legend>
      {picture}
      <View style={{ flexDirection: 'row', alignItems: 'center', gap: space.one }}>
        <DraftField label={names[0]} value={from} form={form} wrong={wrong} onCommit={(v) => onCommit(v, to)} />
        <Text tone="muted">to</Text>
        <DraftField label={names[1]} value={to} form={form} wrong={wrong} onCommit={(v) => onCommit(from, v)} />
      </View>
      {hint ? (
        <Text size={13} tone="muted">
          {hint}
        </Text>
      ) : null}
    </fieldset>
  );
}
