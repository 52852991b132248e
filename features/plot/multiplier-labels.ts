import { type Multiplier, multiplierSize } from '@/features/notation/format-multiplier';
import { toDouble } from '@/features/notation/to-double';
import { LabelRoom } from './label-room';
import { multiplierText } from './multiplier-text';

interface Point {
  x: number;
  y: number;
}

/** Where the circle stands in its picture, px. */
export interface CircleFrame {
  width: number;
  height: number;
  x: number;
  y: number;
  radius: number;
}

/** A text beside a multiplier: its middle and its baseline. */
export interface MultiplierLabel extends Point {
  text: string;
  kind: 'value' | 'side';
  /** Where it stands too far from its dot to be read as its own: the ends of a line between them. */
  leader: readonly [Point, Point] | null;
}

/** Within this of 1 a modulus counts as on the circle. */
const ON_CIRCLE = 1e-6;
/** Multipliers whose parts differ by less than this share of their size are told as one. */
const EQUAL = 1e-9;
/** Side of a dot with the air around it, px. */
const DOT = 9;
/** Pieces of the circle that labels keep off, and the name under it, px. */
const ARCS = 64;
const ARC = 5;
const CIRCLE_NAME = { width: 60, height: 16, under: 12 };
/** A value further from its dot than this has a line to it, px. */
const NEAR = 20;
/** Half of a character, px; from a label's baseline up to its middle. */
const HALF_CHARACTER = 3.3;
const MIDDLE = 4.7;
const times = ['', '', ', twice', ', three times', ', four times', ', five times', ', six times', ', seven times'];

/** Where a multiplier is to be found: inside, on, or outside the circle. */
export function sideOf(multiplier: Multiplier): 'stable' | 'on the circle' | 'unstable' {
  const size = multiplierSize(multiplier);
  if (Math.abs(size - 1) < ON_CIRCLE) return 'on the circle';
  return size > 1 ? 'unstable' : 'stable';
}

interface Group extends Point {
  text: string;
  side: string;
  isReal: boolean;
}

const isEqual = (one: Multiplier, two: Multiplier): boolean => {
  const [re, im] = [toDouble(one.re) - toDouble(two.re), toDouble(one.im) - toDouble(two.im)];
  return Math.hypot(re, im) <= EQUAL * multiplierSize(one);
};

/** Equal multipliers, and the two of a conjugate pair, under one text. */
function groupsOf(placed: readonly (Point & { multiplier: Multiplier })[]): Group[] {
  const groups: (Group & { multiplier: Multiplier; count: number })[] = [];
  for (const { multiplier, x, y } of placed) {
    const { re, im } = multiplier;
    const conjugate = { re, im: im.startsWith('-') ? im.slice(1) : `-${im}` };
    const isReal = toDouble(im) === 0;
    const isPair = !isReal && placed.some(({ multiplier: other }) => isEqual(conjugate, other));
    if (isPair && toDouble(im) < 0) continue;
    const known = groups.find((group) => isEqual(multiplier, group.multiplier));
    if (known) {
      known.count += 1;
      continue;
    }
    const text = isPair ? multiplierText(multiplier).replace(' + ', ' ± ') : multiplierText(multiplier);
    groups.push({ x, y, isReal, side: sideOf(multiplier), text, multiplier, count: 1 });
  }
  return groups.map(({ count, ...group }) => ({
    ...group,
    text: `${group.text}${times[count] ?? `, ${count} times`}`,
  }));
}

/** Places for a value: above and below a real one, outward of a pair; then further away, at the end of a line. */
function placesOf({ x, y, text, isReal }: Group, centre: number): Point[] {
  const half = text.length * HALF_CHARACTER + 4;
  const out = x >= centre ? 1 : -1;
  const around = (away: number): Point[] =>
    [0, half * out, half * 0.5 * out, -half * 0.5 * out, -half * out].flatMap((dx) => [
      { x: x + dx, y: y - away },
      { x: x + dx, y: y + away },
    ]);
  const aside = [
    { x: x + (half + 8) * out, y },
    { x: x + (half + 8) * out, y: y - 12 },
    { x: x - (half + 8) * out, y },
  ];
  const near = around(17);
  return [...(isReal ? near : [...aside, ...near]), ...[32, 46, 60, 74, 88, 102].flatMap(around)];
}

/** The line from a dot to a label that stands away from it. */
function leaderOf({ x, y, text }: Group, label: Point): MultiplierLabel['leader'] {
  const half = text.length * HALF_CHARACTER;
  const middle = label.y - MIDDLE;
  if (Math.abs(middle - y) < NEAR && Math.abs(label.x - x) < half + NEAR) return null;
  const end = { x: Math.min(label.x + half, Math.max(label.x - half, x)), y: middle + (middle < y ? 7 : -7) };
  return [{ x, y }, end];
}

/** What labels keep off: the dots, the circle, and its name. */
function takenRoom(placed: readonly Point[], frame: CircleFrame): LabelRoom {
  const room = new LabelRoom(frame);
  for (const dot of placed) room.take(dot, DOT, DOT);
  for (let i = 0; i < ARCS; i += 1) {
    const angle = (2 * Math.PI * i) / ARCS;
    const { x, y, radius } = frame;
    room.take({ x: x + radius * Math.cos(angle), y: y + radius * Math.sin(angle) }, ARC, ARC);
  }
  const { width, height, under } = CIRCLE_NAME;
  room.take({ x: frame.x, y: frame.y + frame.radius + under }, width, height);
  return room;
}

/**
 * The values beside the multipliers, with a word beside those that stand alone: no text covers another, a dot or the
 * circle, and what finds no room is left to the table.
 */
export function multiplierLabels(
  placed: readonly (Point & { multiplier: Multiplier })[],
  frame: CircleFrame,
): MultiplierLabel[] {
  const room = takenRoom(placed, frame);
  const values = groupsOf(placed).flatMap((group) => {
    const place = room.place(group.text, placesOf(group, frame.x));
    return place ? [{ group, place, leader: leaderOf(group, place) }] : [];
  });
  const sides = values.flatMap(({ group, place, leader }): MultiplierLabel[] => {
    if (!group.isReal || leader !== null) return [];
    // On the other side of the dot than its value, or it would be taken for another's.
    const other = room.place(group.side, [{ x: group.x, y: place.y < group.y ? group.y + 17 : group.y - 16 }]);
    return other ? [{ ...other, text: group.side, kind: 'side', leader: null }] : [];
  });
  return [
    ...values.map(({ group, place, leader }): MultiplierLabel => ({
      ...place,
      text: group.text,
      kind: 'value',
      leader,
    })),
    ...sides,
  ];
}
