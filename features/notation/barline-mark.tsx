import { colour } from '@/features/ui';
import { dotPath } from './dot-path';
import { type OrbitState, stateLook } from './orbit-state';

export interface BarlineMarkProps {
  state: OrbitState;
  /** Right edge, top and bottom of the bar, px. */
  x: number;
  top: number;
  bottom: number;
  /** Draw it in, once. */
  animate?: boolean;
}

const THIN = 1.4;
const THICK = 3.2;
/** From the right edge to the thin line beside the thick one. */
const THIN_FROM_EDGE = 6.6;
const DOTS_FROM_EDGE = 12.5;
const DASHES = '3 2.4';
/** Half the cross on a broken bar. */
const CROSS = 4.4;

function RepeatDots({ x, top, bottom }: BarlineMarkProps) {
  const gap = (bottom - top) / 4;
  const radius = Math.max(1.5, Math.min(3, gap * 0.24));
  const middle = (top + bottom) / 2;
  const at = [middle - gap / 2, middle + gap / 2].map((y) => dotPath(x - DOTS_FROM_EDGE, y, radius));
  return <path d={at.join('')} fill={colour.verdigris} />;
}

function ThinThick({ x, top, bottom }: BarlineMarkProps) {
  return (
    <>
      <path d={`M${x - THIN_FROM_EDGE} ${top}V${bottom}`} stroke={colour.verdigris} strokeWidth={THIN} />
      <path d={`M${x - THICK / 2} ${top}V${bottom}`} stroke={colour.verdigris} strokeWidth={THICK} />
    </>
  );
}

function Broken({ x, top, bottom }: BarlineMarkProps) {
  const at = x - CROSS;
  const middle = (top + bottom) / 2;
  const cross = `M${at - CROSS} ${middle - CROSS}l${2 * CROSS} ${2 * CROSS}m0 ${-2 * CROSS}l${-2 * CROSS} ${2 * CROSS}`;
  return (
    <>
      <path d={`M${at} ${top}V${bottom}`} stroke={colour.oxide} strokeWidth={THIN} strokeDasharray={DASHES} />
      <path d={cross} stroke={colour.oxide} strokeWidth={1.8} fill="none" />
    </>
  );
}

/** The closing barline: how far an orbit has come. Part of a drawing; the word stands beside it. */
export function BarlineMark(props: BarlineMarkProps) {
  const { state, x, top, bottom, animate } = props;
  const edge = x - THIN / 2;
  switch (stateLook[state].barline) {
    case 'none':
      return null;
    case 'dashed':
      return <path d={`M${edge} ${top}V${bottom}`} stroke={colour.muted} strokeWidth={THIN} strokeDasharray={DASHES} />;
    case 'thin':
      return <path d={`M${edge} ${top}V${bottom}`} stroke={colour.ochre} strokeWidth={THIN} />;
    case 'two-thin':
      return (
        <path d={`M${edge} ${top}V${bottom}M${edge - 4} ${top}V${bottom}`} stroke={colour.ochre} strokeWidth={THIN} />
      );
    case 'thin-thick':
      return <ThinThick {...props} />;
    case 'repeat':
      return (
        <g {...(animate && { className: 'r-draw' })}>
          <ThinThick {...props} />
          <RepeatDots {...props} />
        </g>
      );
    case 'broken':
      return <Broken {...props} />;
  }
}
