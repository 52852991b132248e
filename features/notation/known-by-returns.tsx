import { View } from 'react-native';
import { colour, LinkText, Text } from '@/features/ui';
import { formatCount } from './format-count';

interface KnownByReturnsRow {
  returns: number;
  known: number;
  /** What symbolic dynamics allows; `null` where that is not known. */
  allowed?: number | null;
}

export interface KnownByReturnsProps {
  rows: readonly KnownByReturnsRow[];
  /** Where a tap on a row leads: that search. */
  hrefOf?: (returns: number) => string;
  /** px kept for the lines. */
  lineWidth?: number;
}

const ROW = 20;
const TICK = 4;
/** Drawn length of a count of one, px: a stroke that one sees. */
const LEAST = 8;

function lengthOf(count: number, most: number, width: number): number {
  if (count <= 0) return 0;
  return LEAST + (width - LEAST) * (Math.log(count) / Math.log(Math.max(most, 2)));
}

const wordsOf = ({ known, allowed }: KnownByReturnsRow): string =>
  allowed === null || allowed === undefined ? formatCount(known) : `${formatCount(known)} of ${formatCount(allowed)}`;

function Line({ row, most, width }: { row: KnownByReturnsRow; most: number; width: number }) {
  const allowed = lengthOf(row.allowed ?? 0, most, width);
  const known = lengthOf(row.known, most, width);
  const y = ROW / 2;
  return (
    <svg width={width + 2} height={ROW} aria-hidden>
      {allowed > 0 ? (
        <path d={`M0 ${y}H${allowed}M${allowed} ${y - TICK}V${y + TICK}`} stroke={colour.staff} strokeWidth={1.2} />
      ) : null}
      {known > 0 ? <path d={`M0 ${y}H${known}`} stroke={colour.verdigris} strokeWidth={3.2} /> : null}
    </svg>
  );
}

function Row({ row, most, width }: { row: KnownByReturnsRow; most: number; width: number }) {
  const complete = row.allowed !== null && row.allowed !== undefined && row.known >= row.allowed;
  return (
    <View style={{ flexDirection: 'row', alignItems: 'center', gap: 12, minHeight: ROW }}>
      <View style={{ width: 20 }}>
        <Text mono size={14} align="right">
          {row.returns}
        </Text>
      </View>
      <Line row={row} most={most} width={width} />
      <View style={{ flexGrow: 1 }}>
        <Text mono size={14} align="right" tone={complete || row.known > 0 ? 'ink' : 'muted'} nowrap>
          {wordsOf(row)}
        </Text>
      </View>
    </View>
  );
}

/** Known orbits by number of returns: thick what is in the catalogue, thin what symbolic dynamics allows; log scale. */
export function KnownByReturns({ rows, hrefOf, lineWidth = 152 }: KnownByReturnsProps) {
  const most = Math.max(2, ...rows.map(({ known, allowed }) => Math.max(known, allowed ?? 0)));
  return (
    <View role="list">
      {rows.map((row) => (
        <View key={row.returns} role="listitem">
          {hrefOf ? (
            <LinkText whole href={hrefOf(row.returns)} name={`${row.returns} returns: ${wordsOf(row)}`}>
              <Row row={row} most={most} width={lineWidth} />
            </LinkText>
          ) : (
            <Row row={row} most={most} width={lineWidth} />
          )}
        </View>
      ))}
    </View>
  );
}
