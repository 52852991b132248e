import { View } from 'react-native';
import { Digits } from '@/features/notation/digits';
import { FigureRow } from '@/features/notation/figure-row';
import { FindingRow } from '@/features/notation/finding-row';
import { formatMultiplierSize } from '@/features/notation/format-multiplier';
import { Magnitude, type Relation } from '@/features/notation/magnitude';
import { CopyButton, Heading, Labelled, Text } from '@/features/ui';
import type { Entry } from '@/schemas/generated/contract';

/** Below this cosine a crossing is nearly tangent, and a report warns of it. */
const NEAR_TANGENT = 1e-3;
/** Significant digits of a cosine. */
const COSINE_DIGITS = 4;

const within = (value: number, limit: number): Relation => (value <= limit ? '≤' : '>');

/** How far the orbit ends from where it began, in sizes of its extents, against the tolerance. */
export function ClosureField({ entry }: { entry: Entry }) {
  const { relative, tolerance } = entry.closure;
  const closes = relative <= tolerance;
  return (
    <Labelled label="Closure" action={<CopyButton text={String(relative)} what="closure" said="Copied" />}>
      <Text {...(closes && { tone: 'verdigris' as const })}>
        <Magnitude
          value={relative}
          relation={within(relative, tolerance)}
          limit={tolerance}
          {...(closes && { tone: 'verdigris' as const })}
        />
        {'  '}
        {closes ? 'closes' : 'closes after correction'}
      </Text>
    </Labelled>
  );
}

/** The figures of the check, each against its limit, and what it found. */
export function Report({ entry }: { entry: Entry }) {
  const { closure, correction, multipliers, findings } = entry;
  const [largest] = multipliers;
  return (
    <View>
      <Heading level={2}>Check report</Heading>
      <FigureRow ruled={false} name="Closure, as typed" value={closure.absolute} />
      <FigureRow
        name="Closure, relative to extent"
        value={closure.relative}
        relation={within(closure.relative, closure.tolerance)}
        limit={closure.tolerance}
      />
      {correction ? (
        <>
          <FigureRow
            name="Shift by correction"
            value={correction.shift}
            relation={within(correction.shift, closure.tolerance)}
            limit={closure.tolerance}
          />
          <FigureRow name="Closure after correction" value={correction.residual} />
        </>
      ) : null}
      <FigureRow
        name="Transversality, smallest"
        value={entry.smallestTransversality.toPrecision(COSINE_DIGITS)}
        relation={entry.smallestTransversality >= NEAR_TANGENT ? '≥' : '<'}
        limit={NEAR_TANGENT}
      />
      <FigureRow name="Returns counted" value={String(entry.returns)} />
      {largest ? <FigureRow name="Largest multiplier" value={formatMultiplierSize(largest)} /> : null}
      <FigureRow name="Digits confirmed" value={String(entry.evidence.digits)} />
      {entry.invariants.map(({ name, value }) => (
        <Labelled key={name} label={name} action={<CopyButton text={value} what={name} />}>
          <Text>
            <Digits value={value} />
          </Text>
        </Labelled>
      ))}
      {findings.length > 0 ? (
        <View role="list">
          {findings.map((finding, index) => (
            <FindingRow key={index} {...finding} />
          ))}
        </View>
      ) : null}
    </View>
  );
}
