import { G, Path } from 'react-native-svg';
import { colour, series } from '@/features/ui';
import { PlotLabel } from './plot-label';

/** Crossings of another orbit, to be told apart from the one shown. */
export interface OtherOrbit {
  name: string;
  points: readonly (readonly [number, number])[];
}

/** Another orbit as it is drawn, px. */
export interface DrawnOrbit {
  name: string;
  marks: readonly { x: number; y: number }[];
  /** Middle of the name's baseline; null where there is no room for it. */
  place: { x: number; y: number } | null;
}

type Shape = (x: number, y: number) => string;

/** Half the size of an open mark, px. */
const HALF = 4;
const f = (value: number): string => value.toFixed(1);
const ring: Shape = (x, y) =>
  `M${f(x - HALF)} ${f(y)}a${HALF} ${HALF} 0 1 0 ${2 * HALF} 0a${HALF} ${HALF} 0 1 0 ${-2 * HALF} 0Z`;
const square: Shape = (x, y) => `M${f(x - HALF)} ${f(y - HALF)}h${2 * HALF}v${2 * HALF}h${-2 * HALF}Z`;
const triangle: Shape = (x, y) => `M${f(x)} ${f(y - HALF - 1)}l${HALF + 1} ${2 * HALF}h${-2 * (HALF + 1)}Z`;

/** Shape and colour of one orbit after the other: colour is never alone. */
const looks = [
  { shape: ring, paint: series[1] },
  { shape: square, paint: series[3] },
  { shape: triangle, paint: series[0] },
] as const;

/** Crossings of up to three other orbits as open marks, each named beside one of them. */
export function OtherOrbits({ others }: { others: readonly DrawnOrbit[] }) {
  return (
    <G>
      {others.slice(0, looks.length).map(({ name, marks, place }, i) => {
        const { shape, paint } = looks[i] ?? looks[0];
        return (
          <G key={name}>
            <Path d={marks.map(({ x, y }) => shape(x, y)).join('')} fill="none" stroke={paint} strokeWidth={1.4} />
            {place ? (
              <PlotLabel {...place} anchor="middle" paint={paint} halo={colour.page}>
                {name}
              </PlotLabel>
            ) : null}
          </G>
        );
      })}
    </G>
  );
}
