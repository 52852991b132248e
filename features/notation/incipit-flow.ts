import type { IncipitLayout } from './incipit-layout';
import type { IncipitProps } from './incipit-props';

interface Point {
  time: number;
  value: number;
}

/** Times shifted so that the drawing begins at its first note, in order. */
function fromOrigin(flow: readonly (readonly number[])[], layout: IncipitLayout): Point[] {
  const points = flow.map(([time = 0, value = 0]) => ({ time, value }));
  if (layout.origin === 0) return points;
  const { origin, period } = layout;
  const after = points.filter((p) => p.time >= origin).map((p) => ({ ...p, time: p.time - origin }));
  const before = points.filter((p) => p.time < origin).map((p) => ({ ...p, time: p.time + period - origin }));
  return [...after, ...before];
}

/** The flow's hairline as a path; it breaks where an angle jumps, and ends with the staff or the time reached. */
export function incipitFlow(props: IncipitProps, layout: IncipitLayout): string {
  if (!props.flow || props.flow.length === 0) return '';
  const jump = props.modulus ? props.modulus / 2 : Infinity;
  const last = Math.min(props.upTo ?? Infinity, layout.period);
  let path = '';
  let previous: Point | null = null;
  for (const point of fromOrigin(props.flow, layout)) {
    const x = layout.xOf(point.time);
    if (point.time > last || x > layout.right) break;
    const breaks = previous === null || Math.abs(point.value - previous.value) > jump;
    path += `${breaks ? 'M' : 'L'}${x.toFixed(1)} ${layout.yOf(point.value).toFixed(1)}`;
    previous = point;
  }
  return path;
}
