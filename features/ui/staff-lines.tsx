import { View } from 'react-native';
import { useContainerWidth } from './layout';
import { colour, staffSpace } from './tokens';

export interface StaffLinesProps {
  /** `empty`: five lines. `stopping`: they end early. `loading`: a bar moves along once a beat. */
  kind: 'empty' | 'stopping' | 'loading';
  /** px; as wide as its container unless given. */
  width?: number;
  /** Distance of two lines, px. */
  lineGap?: number;
}

const STAFF_STROKE = 0.8;
const BAR_STROKE = 1.4;
/** Where a staff stops when what it waited for did not come: the part that is drawn. */
const STOPS_AT = 0.6;
/** Space above and below the lines, in gaps, so that a staff takes the height of an incipit. */
const MARGIN = 1.6;

/** Five lines without music: waiting, nothing found, or broken off. Decoration; the words stand beside it. */
export function StaffLines({ kind, width, lineGap = staffSpace }: StaffLinesProps) {
  const container = useContainerWidth();
  const drawn = width ?? container;
  const end = kind === 'stopping' ? drawn * STOPS_AT : drawn;
  const top = lineGap * MARGIN;
  const height = lineGap * (4 + 2 * MARGIN);
  const lines = [0, 1, 2, 3, 4].map((i) => `M0 ${top + i * lineGap}H${end}`).join('');
  return (
    <View aria-hidden style={{ height, overflow: 'hidden', width: width ?? '100%' }}>
      <svg width={drawn} height={height}>
        <path d={lines} stroke={colour.staff} strokeWidth={STAFF_STROKE} fill="none" />
      </svg>
      {kind === 'loading' ? (
        <div className="r-beat" style={{ position: 'absolute', inset: 0 }}>
          <svg width="100%" height={height}>
            <line x1="1%" x2="1%" y1={top} y2={top + 4 * lineGap} stroke={colour.ink} strokeWidth={BAR_STROKE} />
          </svg>
        </div>
      ) : null}
    </View>
  );
}
