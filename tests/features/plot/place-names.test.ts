import { placeNames } from '@/features/plot/place-names';

const bounds = { width: 400, height: 400, axes: { x: 60, y: 350 } };
/** Width of a name's box as it is placed: 6.6 px a character and 4 px of air. */
const halfOf = (name: string) => (name.length * 6.6 + 4) / 2;

describe('names in a picture', () => {
  it('stand beside their own marks and do not cover each other, though the marks coincide', () => {
    const marks = [
      { x: 200, y: 200 },
      { x: 205, y: 204 },
    ];
    const names = ['RTN-00000019', 'RTN-00000027', 'RTN-00000035'];
    const places = placeNames(
      marks,
      names.map((name) => ({ name, marks })),
      bounds,
    );
    expect(places).not.toContain(null);
    for (const [i, one] of places.entries()) {
      for (const other of places.slice(i + 1)) {
        const apart = Math.abs(one!.x - other!.x) >= 2 * halfOf(names[0]!) || Math.abs(one!.y - other!.y) >= 13;
        expect(apart).toBe(true);
      }
    }
  });

  it('stay off the axes', () => {
    const [place] = placeNames([], [{ name: 'RTN-00000019', marks: [{ x: 70, y: 345 }] }], bounds);
    expect(place!.x - halfOf('RTN-00000019')).toBeGreaterThanOrEqual(bounds.axes.x);
    expect(place!.y).toBeLessThanOrEqual(bounds.axes.y);
  });

  it('are left out where there is no room', () => {
    const tight = { width: 60, height: 60, axes: { x: 20, y: 50 } };
    expect(placeNames([], [{ name: 'RTN-00000019', marks: [{ x: 30, y: 30 }] }], tight)).toEqual([null]);
  });
});
