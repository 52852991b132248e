import { LabelRoom } from './label-room';

/** A number that wants to stand beside its mark. */
export interface PlacedLabel {
  index: number;
  text: string;
  x: number;
  y: number;
}

interface Point {
  x: number;
  y: number;
}

/** Two marks closer than this share a number, px. */
const CROWDED = 20;
/** Places around a mark that are tried, in order: offsets of the label's centre, px. */
const PLACES: readonly Point[] = [
  { x: 11, y: -12 },
  { x: -11, y: 14 },
  { x: -11, y: -12 },
  { x: 11, y: 14 },
  { x: 17, y: 2 },
  { x: -17, y: 2 },
  { x: 0, y: -16 },
  { x: 0, y: 18 },
];

/** First and last first: they are what one looks for. */
const byPriority = (count: number): number[] =>
  count < 2 ? [0].slice(0, count) : [0, count - 1, ...Array.from({ length: count - 2 }, (_, i) => i + 1)];

/** A mark beside one that has its number needs none: the order can be read. */
const isCrowded = (mark: Point, labels: readonly PlacedLabel[], marks: readonly Point[]): boolean =>
  labels.some(({ index }) => {
    const other = marks[index];
    return other !== undefined && Math.hypot(other.x - mark.x, other.y - mark.y) < CROWDED;
  });

/**
 * Number the marks where there is room: labels never cover a mark or each other; those without room are left out.
 *
 * @param room what is taken already; marks and numbers are added to it.
 */
export function placeLabels(
  marks: readonly Point[],
  bounds: { width: number; height: number },
  room = new LabelRoom(bounds),
): PlacedLabel[] {
  for (const mark of marks) room.take(mark, 10, 8);
  const labels: PlacedLabel[] = [];
  for (const index of byPriority(marks.length)) {
    const mark = marks[index];
    if (!mark || isCrowded(mark, labels, marks)) continue;
    const text = String(index + 1);
    const place = room.place(
      text,
      PLACES.map(({ x, y }) => ({ x: mark.x + x, y: mark.y + y })),
    );
    if (place) labels.push({ index, text, ...place });
  }
  return labels;
}
