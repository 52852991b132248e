import type { PlanePoint } from './section-plot';

/** A rectangle of the plane. */
export interface PlaneBox {
  x: readonly [number, number];
  y: readonly [number, number];
}

type Segment = readonly [PlanePoint, PlanePoint];

const zeroBetween = (a: number, b: number): number => a / (a - b);

/** Where the zero line enters and leaves one cell, by linear interpolation on its edges. */
function cellSegments(
  corners: readonly [number, number, number, number],
  x: readonly [number, number],
  y: readonly [number, number],
): Segment[] {
  const [southWest, southEast, northEast, northWest] = corners;
  const across = (from: number, to: number) => x[0] + zeroBetween(from, to) * (x[1] - x[0]);
  const up = (from: number, to: number) => y[0] + zeroBetween(from, to) * (y[1] - y[0]);
  const differ = (a: number, b: number) => a < 0 !== b < 0;
  const points: PlanePoint[] = [];
  if (differ(southWest, southEast)) points.push([across(southWest, southEast), y[0]]);
  if (differ(southEast, northEast)) points.push([x[1], up(southEast, northEast)]);
  if (differ(northWest, northEast)) points.push([across(northWest, northEast), y[1]]);
  if (differ(southWest, northWest)) points.push([x[0], up(southWest, northWest)]);
  const [a, b, c, d] = points;
  if (a && b && c && d)
    return [
      [a, b],
      [c, d],
    ];
  return a && b ? [[a, b]] : [];
}

const key = ([x, y]: PlanePoint): string => `${x.toPrecision(9)},${y.toPrecision(9)}`;

/** Join segments that share an end into lines. */
function joined(segments: readonly Segment[]): PlanePoint[][] {
  const byEnd = new Map<string, Segment[]>();
  for (const segment of segments) {
    for (const end of segment) byEnd.set(key(end), [...(byEnd.get(key(end)) ?? []), segment]);
  }
  const used = new Set<Segment>();
  const follow = (from: PlanePoint): PlanePoint[] => {
    const line: PlanePoint[] = [];
    let at = from;
    for (;;) {
      const next = byEnd.get(key(at))?.find((segment) => !used.has(segment));
      if (!next) return line;
      used.add(next);
      at = key(next[0]) === key(at) ? next[1] : next[0];
      line.push(at);
    }
  };
  return segments.flatMap((segment) => {
    if (used.has(segment)) return [];
    used.add(segment);
    return [[...follow(segment[0]).reverse(), segment[0], segment[1], ...follow(segment[1])]];
  });
}

/** The lines on which f(x, y) = 0 in a box, found on a grid of `cells` × `cells` (marching squares). */
export function levelLines(f: (x: number, y: number) => number, box: PlaneBox, cells = 80): PlanePoint[][] {
  const at = (range: readonly [number, number], i: number) => range[0] + ((range[1] - range[0]) * i) / cells;
  const values = Array.from({ length: cells + 1 }, (_, j) =>
    Float64Array.from({ length: cells + 1 }, (_unused, i) => f(at(box.x, i), at(box.y, j))),
  );
  const segments: Segment[] = [];
  for (let j = 0; j < cells; j += 1) {
    for (let i = 0; i < cells; i += 1) {
      const [low, high] = [values[j], values[j + 1]];
      const corners = [low?.[i] ?? NaN, low?.[i + 1] ?? NaN, high?.[i + 1] ?? NaN, high?.[i] ?? NaN] as const;
      if (corners.some((value) => !Number.isFinite(value))) continue;
      segments.push(...cellSegments(corners, [at(box.x, i), at(box.x, i + 1)], [at(box.y, j), at(box.y, j + 1)]));
    }
  }
  return joined(segments);
}
