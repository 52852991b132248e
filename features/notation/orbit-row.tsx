import type { ReactNode } from 'react';
import { View, type ViewStyle } from 'react-native';
import { colour, LinkText, space, staffSpace, Text } from '@/features/ui';
import { formatMultiplierSize } from './format-multiplier';
import { Incipit } from './incipit';
import type { OrbitCardProps } from './orbit-card';
import { ShortDigits } from './short-digits';
import { shortItinerary } from './short-itinerary';

/** Column widths in staff spaces; the incipit takes what is left. */
const COLUMNS = { accession: 16, period: 20, itinerary: 13.5, multiplier: 9, evidence: 11 } as const;
const GAP = 20;

const column = (name: keyof typeof COLUMNS): ViewStyle => ({ width: COLUMNS[name] * staffSpace, flexShrink: 0 });
const incipitColumn: ViewStyle = { flexGrow: 1, flexShrink: 1, flexBasis: 220, minWidth: 180, maxWidth: 400 };
const row: ViewStyle = { flexDirection: 'row', alignItems: 'center', gap: GAP };

function Head({ children, style, right }: { children: ReactNode; style: ViewStyle; right?: boolean }) {
  return (
    <View style={style}>
      <Text size={13} tone="muted" smallCaps nowrap align={right ? 'right' : 'left'}>
        {children}
      </Text>
    </View>
  );
}

/** The heads of the columns of `OrbitRow`. */
export function OrbitRowHead({ coordinate }: { coordinate: string | null }) {
  return (
    <View style={[row, { paddingBottom: space.half, borderBottomWidth: 1, borderColor: colour.hairline }]} aria-hidden>
      <Head style={column('accession')}>Accession</Head>
      <Head style={incipitColumn}>
        Incipit
        {coordinate ? (
          <>
            ,{' '}
            <Text italic smallCaps={false}>
              {coordinate}
            </Text>{' '}
            at the crossings
          </>
        ) : null}
      </Head>
      <Head style={column('period')}>Period</Head>
      <Head style={column('itinerary')}>Itinerary</Head>
      <Head style={column('multiplier')} right>
        <Text mono smallCaps={false}>
          |μ|
        </Text>
      </Head>
      <Head style={column('evidence')}>Evidence</Head>
    </View>
  );
}

function Accession({ orbit, showSystem }: Pick<OrbitRowProps, 'orbit' | 'showSystem'>) {
  return (
    <View style={column('accession')}>
      <Text weight="semibold" nowrap>
        {orbit.accession}
      </Text>
      {showSystem ? (
        <Text size={13} tone="muted" italic lines={1}>
          {orbit.system.name}
        </Text>
      ) : null}
    </View>
  );
}

function Figures({ orbit, note }: Pick<OrbitRowProps, 'orbit' | 'note'>) {
  const largest = orbit.multipliers[0];
  return (
    <>
      <View style={column('period')}>
        <Text>
          <ShortDigits value={orbit.period} verified={orbit.evidence.digits} />
        </Text>
      </View>
      <View style={column('itinerary')}>
        <Text mono size={14} tone="muted" lines={1} {...(orbit.itinerary && { title: orbit.itinerary })}>
          {orbit.itinerary ? shortItinerary(orbit.itinerary) : '–'}
        </Text>
      </View>
      <View style={column('multiplier')}>
        <Text mono align="right" nowrap>
          {largest ? formatMultiplierSize(largest) : '–'}
        </Text>
      </View>
      <View style={column('evidence')}>
        <Text size={14} tone="muted" nowrap>
          {note ?? (orbit.status === 'withdrawn' ? 'withdrawn' : orbit.evidence.level)}
        </Text>
      </View>
    </>
  );
}

export interface OrbitRowProps extends OrbitCardProps {
  /** No system was chosen: its name stands under the accession. */
  showSystem?: boolean;
}

/** One entry on a wide screen: a line of the thematic catalogue. The whole row is a link. */
export function OrbitRow({ orbit, music, href, onPress, selected, note, showSystem }: OrbitRowProps) {
  return (
    <LinkText href={href} whole {...(onPress && { onPress })}>
      <div className="r-row" {...(selected && { 'data-selected': '' })}>
        <Accession orbit={orbit} {...(showSystem && { showSystem })} />
        <View style={incipitColumn}>
          <Incipit {...music} space={7} />
        </View>
        <Figures orbit={orbit} {...(note && { note })} />
      </div>
    </LinkText>
  );
}
