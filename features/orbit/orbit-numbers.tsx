import { useState } from 'react';
import { View } from 'react-native';
import { Digits } from '@/features/notation/digits';
import { DigitsLeftOut } from '@/features/notation/digits-left-out';
import { formatCount } from '@/features/notation/format-count';
import { mathName } from '@/features/notation/math-name';
import { verifiedDigits } from '@/features/orbit/verified-digits';
import { planeLevel } from '@/features/plot/plane-level';
import { CopyButton, DataTable, Heading, Labelled, space, Text, TextButton, useLayout } from '@/features/ui';
import type { Entry, System } from '@/schemas/generated/contract';

/** Return times shown before one asks for all. */
const FIRST_SHOWN = 32;
/** Significant digits of a cosine. */
const COSINE_DIGITS = 4;

/** Every digit of a refined number was computed here; of others as many as the check confirmed. */
const verifiedIn = ({ evidence: { level, digits } }: Entry): number => (level === 'refined' ? Infinity : digits);

export function PeriodField({ entry }: { entry: Entry }) {
  const [all, setAll] = useState(false);
  return (
    <Labelled
      label={
        <>
          Period <Text italic>T</Text>
        </>
      }
      action={<CopyButton text={entry.period} what="period" />}
    >
      <Text>
        <Digits value={entry.period} verified={verifiedIn(entry)} {...(all && { max: Infinity })} />
      </Text>
      <DigitsLeftOut value={entry.period} all={all} onChange={setAll} what="period" />
      <Text size={13} tone="muted">
        Underlined: verified here.{entry.evidence.level === 'refined' ? '' : ' Paler: as submitted.'}
      </Text>
    </Labelled>
  );
}

/** The start, one coordinate a row; the one that the section fixes is said to be so. */
export function PointField({ entry, system }: { entry: Entry; system: System | undefined }) {
  const variables = system?.document.variables.map(({ name }) => name) ?? [];
  const fixed = planeLevel(entry.section.formula, variables)?.variable;
  const [all, setAll] = useState(false);
  const most = all ? { max: Infinity } : {};
  const longest = entry.point.reduce((one, other) => (other.length > one.length ? other : one), '');
  return (
    <Labelled
      label="Point on the section"
      action={<CopyButton text={entry.point.join(', ')} what="point" said="Copied" />}
    >
      {entry.point.map((value, index) => (
        <View key={index} style={{ flexDirection: 'row', gap: space.one, alignItems: 'baseline' }}>
          <View style={{ minWidth: 16 }}>
            <Text italic>{mathName(variables[index] ?? '')}</Text>
          </View>
          <View style={{ flexShrink: 1, minWidth: 0 }}>
            {variables[index] === fixed ? (
              <Text>
                <Digits value={value} {...most} />{' '}
                <Text size={14} tone="muted">
                  fixed by the section
                </Text>
              </Text>
            ) : (
              <Text>
                <Digits
                  value={value}
                  verified={verifiedDigits(value, entry.extent[index], verifiedIn(entry))}
                  {...most}
                />
              </Text>
            )}
          </View>
        </View>
      ))}
      <DigitsLeftOut value={longest} all={all} onChange={setAll} what="point" />
    </Labelled>
  );
}

export interface ReturnTimesProps {
  entry: Entry;
  selected: number | null;
  onSelect: (crossing: number) => void;
}

/** Return times with the transversality of each crossing; a row and its note are selected together. */
export function ReturnTimes({ entry, selected, onSelect }: ReturnTimesProps) {
  const [all, setAll] = useState(false);
  const phone = useLayout() === 'phone';
  const cosines = startFirst(entry.crossings.map(({ transversality }) => transversality));
  const shown = all ? entry.returnTimes : entry.returnTimes.slice(0, FIRST_SHOWN);
  const copy = (
    <CopyButton text={entry.returnTimes.join('\n')} what="return times" said={`Copied, ${entry.returns} numbers`} />
  );
  return (
    <View style={{ gap: space.one }}>
      <View style={{ flexDirection: 'row', justifyContent: 'space-between', alignItems: 'baseline' }}>
        <Heading level={3}>{phone ? 'Return times' : 'Return times and crossings'}</Heading>
        {copy}
      </View>
      <DataTable
        caption="Return times and crossings"
        hideCaption
        narrow
        columns={[
          { key: 'number', head: 'No.' },
          { key: 'time', head: 'Return time', mono: true },
          ...(phone ? [] : [{ key: 'cosine', head: 'Transversality', mono: true }]),
        ]}
        rows={shown.map((time, index) => ({
          key: String(index),
          cells: {
            number: index + 1,
            time: <Digits value={time} verified={verifiedIn(entry)} />,
            cosine: (cosines[index] ?? 0).toPrecision(COSINE_DIGITS),
          },
        }))}
        selected={selected === null ? null : String(selected)}
        onSelect={(key) => onSelect(Number.parseInt(key, 10))}
      />
      {entry.returnTimes.length > FIRST_SHOWN ? (
        <TextButton onPress={() => setAll(!all)}>
          {all ? `First ${FIRST_SHOWN} only` : `Show all ${formatCount(entry.returnTimes.length)}`}
        </TextButton>
      ) : null}
    </View>
  );
}

/** Crossings are given in order of time with the start last; here it comes first. */
const startFirst = <T,>(values: readonly T[]): T[] => [...values.slice(-1), ...values.slice(0, -1)];
