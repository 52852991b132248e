import { useState } from 'react';
import { View } from 'react-native';
import { closedOrbit } from '@/features/checking/closed-orbit';
import { Digits } from '@/features/notation/digits';
import { DigitsLeftOut } from '@/features/notation/digits-left-out';
import { mathName } from '@/features/notation/math-name';
import { CopyButton, Heading, Labelled, space, Text } from '@/features/ui';
import type { CheckReport } from '@/schemas/generated/contract';

/** Numbers that doubles hold are said by the form and the corrections; longer ones are what was asked for. */
const DIGITS_OF_DOUBLES = 17;

interface ReportNumbersProps {
  report: CheckReport;
  /** Names of the coordinates. */
  variables: readonly string[];
}

/** Period, point and return times of an orbit that was computed to many digits. */
export function ReportNumbers({ report, variables }: ReportNumbersProps) {
  const [all, setAll] = useState(false);
  const orbit = closedOrbit(report);
  const confirmed = report.digits?.confirmed ?? 0;
  if (orbit === null || confirmed <= DIGITS_OF_DOUBLES) return null;
  const { period, point, crossings } = orbit;
  const times = crossings.map(({ returnTime }) => returnTime);
  const shown = { verified: Infinity, ...(all && { max: Infinity }) };
  return (
    <View>
      <Heading level={3}>{`Computed to ${confirmed} digits`}</Heading>
      <Labelled label="Period" action={<CopyButton text={period} what="period" />}>
        <Text>
          <Digits value={period} {...shown} />
        </Text>
        <DigitsLeftOut value={period} all={all} onChange={setAll} what="orbit" />
      </Labelled>
      <Labelled label="Point on the section" action={<CopyButton text={point.join(', ')} what="point" said="Copied" />}>
        {point.map((value, index) => (
          <View key={index} style={{ flexDirection: 'row', gap: space.one, alignItems: 'baseline' }}>
            <View style={{ minWidth: 16 }}>
              <Text italic>{mathName(variables[index] ?? '')}</Text>
            </View>
            <View style={{ flexShrink: 1, minWidth: 0 }}>
              <Text>
                <Digits value={value} {...shown} />
              </Text>
            </View>
          </View>
        ))}
      </Labelled>
      <Labelled
        label="Return times"
        action={<CopyButton text={times.join('\n')} what="return times" said={`Copied, ${times.length} numbers`} />}
      >
        <Text>{`${times.length} of ${confirmed} digits each.`}</Text>
      </Labelled>
    </View>
  );
}
