import { LabelRoom } from './label-room';
import { placeLabels } from './place-labels';

interface Point {
  x: number;
  y: number;
}

/** Side of an open mark, px. */
const MARK = 8;
/** Names keep so far from an axis, px. */
const CLEAR = 4;

/** Where a name may stand, from the centre of one of its marks, px: above, below, at the sides, then a line further out. */
const offsets = (name: string): readonly (readonly [number, number])[] => {
  const side = name.length * 3.3 + 10;
  return [
    [0, -14],
    [0, 15],
    [side, 0],
    [-side, 0],
    [side, -12],
    [-side, -12],
    [side, 13],
    [-side, 13],
    [0, -28],
    [0, 29],
    [side, -26],
    [-side, -26],
    [side, 27],
    [-side, 27],
  ];
};

/** A picture with its axes: left of the one and under the other stand their own labels. */
interface Bounds {
  width: number;
  height: number;
  axes: Point;
}

interface Named {
  name: string;
  /** The name stands beside one of these. */
  marks: readonly Point[];
}

/** Where names stand in a picture: the numbers of its crossings take their places first, then the names, in order. */
export function placeNames(crossings: readonly Point[], named: readonly Named[], bounds: Bounds): (Point | null)[] {
  const { width, height, axes } = bounds;
  const room = new LabelRoom(bounds);
  room.take({ x: axes.x / 2, y: height / 2 }, axes.x + 2 * CLEAR, height);
  room.take({ x: width / 2, y: (axes.y + height) / 2 }, width, height - axes.y + 2 * CLEAR);
  placeLabels(crossings, bounds, room);
  for (const { marks } of named) for (const mark of marks) room.take(mark, MARK, MARK);
  return named.map(({ name, marks }) =>
    room.place(
      name,
      marks.flatMap(({ x, y }) => offsets(name).map(([dx, dy]) => ({ x: x + dx, y: y + dy }))),
    ),
  );
}
