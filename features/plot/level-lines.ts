import type { PlanePoint } from './plane-point';

/** A rectangle of the plane. */
export interface PlaneBox {
  x: readonly [number, number];
  y: readonly [number, number];
}

/** Where the zero line meets an edge of the grid; the edge's name is exact where coordinates are rounded. */
interface Meeting {
  edge: string;
  point: PlanePoint;
}

type Segment = readonly [Meeting, Meeting];

/** Values of a function on a grid: `values[j][i]` at (x[i], y[j]). */
interface Grid {
  x: number[];
  y: number[];
  values: Float64Array[];
}

function gridOf(f: (x: number, y: number) => number, box: PlaneBox, cells: number): Grid {
  const steps = (range: readonly [number, number]) =>
    Array.from({ length: cells + 1 }, (_, i) => range[0] + ((range[1] - range[0]) * i) / cells);
  const [x, y] = [steps(box.x), steps(box.y)];
  return { x, y, values: y.map((b) => Float64Array.from(x, (a) => f(a, b))) };
}

/** Where f = 0 between grid points (i, j) and (k, l), by linear interpolation; null when the sign is the same. */
function meeting(
  { x, y, values }: Grid,
  [i, j]: readonly [number, number],
  [k, l]: readonly [number, number],
): Meeting | null {
  const [a, b] = [values[j]?.[i] ?? NaN, values[l]?.[k] ?? NaN];
  if (!Number.isFinite(a) || !Number.isFinite(b) || a < 0 === b < 0) return null;
  const part = a / (a - b);
  const between = (from = 0, to = 0) => from + part * (to - from);
  return { edge: `${i},${j},${k},${l}`, point: [between(x[i], x[k]), between(y[j], y[l])] };
}

function cellSegments(grid: Grid, i: number, j: number): Segment[] {
  const meetings = [
    meeting(grid, [i, j], [i + 1, j]),
    meeting(grid, [i + 1, j], [i + 1, j + 1]),
    meeting(grid, [i, j + 1], [i + 1, j + 1]),
    meeting(grid, [i, j], [i, j + 1]),
  ].filter((found) => found !== null);
  const [a, b, c, d] = meetings;
  if (a && b && c && d)
    return [
      [a, b],
      [c, d],
    ];
  return a && b && !c ? [[a, b]] : [];
}

/** Join segments that meet the same edge into lines. */
function joined(segments: readonly Segment[]): PlanePoint[][] {
  const byEdge = new Map<string, Segment[]>();
  for (const segment of segments) {
    for (const { edge } of segment) byEdge.set(edge, [...(byEdge.get(edge) ?? []), segment]);
  }
  const used = new Set<Segment>();
  const follow = (from: Meeting): PlanePoint[] => {
    const line: PlanePoint[] = [];
    let at = from;
    for (;;) {
      const next = byEdge.get(at.edge)?.find((segment) => !used.has(segment));
      if (!next) return line;
      used.add(next);
      at = next[0].edge === at.edge ? next[1] : next[0];
      line.push(at.point);
    }
  };
  return segments.flatMap((segment) => {
    if (used.has(segment)) return [];
    used.add(segment);
    const [first, last] = segment;
    const before = follow(first).reverse();
    return [[...before, first.point, last.point, ...follow(last)]];
  });
}

/** The lines on which f(x, y) = 0 in a box, found on a grid of `cells` × `cells` (marching squares). */
export function levelLines(f: (x: number, y: number) => number, box: PlaneBox, cells = 80): PlanePoint[][] {
  const grid = gridOf(f, box, cells);
  const segments: Segment[] = [];
  for (let j = 0; j < cells; j += 1) {
    for (let i = 0; i < cells; i += 1) segments.push(...cellSegments(grid, i, j));
  }
  return joined(segments);
}
