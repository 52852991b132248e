import { extremeText } from '@/features/plot/extreme-text';
import { levelLines } from '@/features/plot/level-lines';
import { placeLabels } from '@/features/plot/place-labels';
import { planeLevel } from '@/features/plot/plane-level';
import { plotFrame } from '@/features/plot/plot-frame';
import { rangeOf } from '@/features/plot/range-of';
import { traceCrossings } from '@/features/plot/trace-crossings';
import { seenFrom } from '@/features/plot/turn';

describe('plotFrame', () => {
  const margin = { left: 0, right: 0, top: 0, bottom: 0 };

  it('spans the data and nothing else', () => {
    const frame = plotFrame({ width: 200, height: 100, xRange: [-1, 3], yRange: [5, 10], margin });
    expect([frame.x(-1), frame.x(3), frame.y(5), frame.y(10)]).toEqual([0, 200, 100, 0]);
  });

  it('keeps equal scales where asked, in the middle of the picture', () => {
    const frame = plotFrame({ width: 200, height: 100, xRange: [0, 1], yRange: [0, 1], equal: true, margin });
    expect(frame.x(1) - frame.x(0)).toBeCloseTo(frame.y(0) - frame.y(1), 10);
    expect([frame.left, frame.right]).toEqual([50, 150]);
  });

  it('gives up equal scales that would make the picture a line', () => {
    const frame = plotFrame({ width: 200, height: 100, xRange: [0, 1], yRange: [0, 1000], equal: true, margin });
    expect(frame.x(1) - frame.x(0)).toBe(200);
  });
});

describe('rangeOf', () => {
  it('has a width even for one value or none', () => {
    expect(rangeOf([3, 3])).toEqual([2.5, 3.5]);
    expect(rangeOf([])).toEqual([0, 1]);
  });
});

describe('extremeText', () => {
  it.each([
    [44.0312, '44.03'],
    [-16.484, '−16.48'],
    [6.64, '6.64'],
    [6.683940833, '6.684'],
    [0, '0'],
    [2.5e-7, '2.50·10⁻⁷'],
  ])('writes %d as %s', (value, text) => {
    expect(extremeText(value)).toBe(text);
  });
});

describe('planeLevel', () => {
  it.each([
    ['z - 27', { variable: 'z', level: 27 }],
    ['x + 1.5', { variable: 'x', level: -1.5 }],
    ['-y', { variable: 'y', level: 0 }],
    ['-z + 27', { variable: 'z', level: 27 }],
    ['27 - z', { variable: 'z', level: 27 }],
    ['x*y - 72', null],
    ['w - 1', null],
  ])('reads %s', (formula, level) => {
    expect(planeLevel(formula, ['x', 'y', 'z'])).toEqual(level);
  });
});

describe('seenFrom', () => {
  it('is the plain projection unturned, and shows the third coordinate after a quarter turn', () => {
    expect(seenFrom({ yaw: 0, pitch: 0 }, [1, 2, 3])).toEqual([1, 2]);
    const [across, up] = seenFrom({ yaw: 90, pitch: 0 }, [1, 2, 3]);
    expect([across, up].map((c) => c.toFixed(9))).toEqual(['3.000000000', '2.000000000']);
  });

  it('keeps lengths when only turned', () => {
    const turn = { yaw: 37, pitch: 0 };
    const [a] = seenFrom(turn, [3, 0, 4]);
    const [b] = seenFrom({ ...turn, yaw: turn.yaw + 90 }, [3, 0, 4]);
    expect(Math.hypot(a, b)).toBeCloseTo(5, 12);
  });
});

describe('levelLines', () => {
  it('finds a circle as one closed line on the circle', () => {
    const lines = levelLines((x, y) => x * x + y * y - 1, { x: [-1.5, 1.5], y: [-1.5, 1.5] }, 60);
    expect(lines).toHaveLength(1);
    const [circle] = lines;
    // Linear interpolation on a cell of side h is off by at most h²/4 here (curvature 1): h = 0.05.
    for (const [x, y] of circle!) expect(Math.abs(Math.hypot(x, y) - 1)).toBeLessThan(0.05 ** 2 / 4);
    expect(circle!.length).toBeGreaterThan(100);
  });

  it('keeps two branches apart, and finds nothing where the sign never changes', () => {
    const box = { x: [-20, 20], y: [-20, 20] } as const;
    expect(levelLines((x, y) => x * y - 72, box)).toHaveLength(2);
    expect(levelLines(() => 1, box)).toEqual([]);
  });
});

describe('placeLabels', () => {
  it('numbers marks that have room and leaves out those that crowd a numbered one', () => {
    const marks = [
      { x: 50, y: 50 },
      { x: 54, y: 50 },
      { x: 150, y: 50 },
    ];
    expect(placeLabels(marks, { width: 200, height: 100 }).map(({ text }) => text)).toEqual(['1', '3']);
  });
});

describe('traceCrossings', () => {
  const trace = { variables: ['x'], times: [0, 2], points: [[1], [1]], closes: true };

  it('puts the start first: of a closed orbit it is the crossing at T', () => {
    const crossings = [
      { time: 1, point: [5] },
      { time: 2, point: [1] },
    ];
    expect(traceCrossings({ ...trace, crossings })).toEqual([
      { time: 0, point: [1] },
      { time: 1, point: [5] },
    ]);
  });

  it('leaves a trace alone that does not close', () => {
    const crossings = [{ time: 2, point: [3] }];
    expect(traceCrossings({ ...trace, crossings, closes: false })).toBe(crossings);
  });
});
