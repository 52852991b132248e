/** A polyline as a path; it breaks where two neighbours are further apart than `jump` px (an angle's cut). */
export function polylinePath(points: Iterable<readonly [number, number]>, jump = Infinity): string {
  let path = '';
  let previous: readonly [number, number] | null = null;
  for (const point of points) {
    const breaks =
      previous === null || Math.abs(point[0] - previous[0]) > jump || Math.abs(point[1] - previous[1]) > jump;
    path += `${breaks ? 'M' : 'L'}${point[0].toFixed(1)} ${point[1].toFixed(1)}`;
    previous = point;
  }
  return path;
}
