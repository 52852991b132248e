/** A number that wants to stand beside its mark. */
export interface PlacedLabel {
  index: number;
  text: string;
  x: number;
  y: number;
}

interface Box {
  x0: number;
  x1: number;
  y0: number;
  y1: number;
}

interface Point {
  x: number;
  y: number;
}

const SIZE = 13;
const CHARACTER = 6.6;
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

const overlaps = (a: Box, b: Box): boolean => a.x0 < b.x1 && b.x0 < a.x1 && a.y0 < b.y1 && b.y0 < a.y1;

const around = ({ x, y }: Point, width: number, height: number): Box => ({
  x0: x - width / 2,
  x1: x + width / 2,
  y0: y - height / 2,
  y1: y + height / 2,
});

/** First and last first: they are what one looks for. */
const byPriority = (count: number): number[] =>
  count < 2 ? [0].slice(0, count) : [0, count - 1, ...Array.from({ length: count - 2 }, (_, i) => i + 1)];

/** A mark beside one that has its number needs none: the order can be read. */
const isCrowded = (mark: Point, labels: readonly PlacedLabel[], marks: readonly Point[]): boolean =>
  labels.some(({ index }) => {
    const other = marks[index];
    return other !== undefined && Math.hypot(other.x - mark.x, other.y - mark.y) < CROWDED;
  });

/** Number the marks where there is room: labels never cover a mark or each other; those without room are left out. */
export function placeLabels(marks: readonly Point[], bounds: { width: number; height: number }): PlacedLabel[] {
  const taken: Box[] = marks.map((mark) => around(mark, 10, 8));
  const labels: PlacedLabel[] = [];
  for (const index of byPriority(marks.length)) {
    const mark = marks[index];
    if (!mark || isCrowded(mark, labels, marks)) continue;
    const text = String(index + 1);
    for (const place of PLACES) {
      const centre = { x: mark.x + place.x, y: mark.y + place.y };
      const box = around(centre, text.length * CHARACTER + 4, SIZE);
      const isInside = box.x0 > 0 && box.x1 < bounds.width && box.y0 > 0 && box.y1 < bounds.height;
      if (isInside && !taken.some((other) => overlaps(box, other))) {
        taken.push(box);
        labels.push({ index, text, x: centre.x, y: centre.y + SIZE * 0.36 });
        break;
      }
    }
  }
  return labels;
}
