import { traceOrbit } from '@/server/checks/trace-orbit';
import { circle, lorenz, LORENZ_AB } from './claims';

describe('traceOrbit', () => {
  it('draws points of the unit circle, from 0 to the period', () => {
    const trace = traceOrbit(
      circle,
      { section: { formula: 'y' }, point: ['1', '0'], period: '6.283185307179586' },
      50,
    )!;
    expect(trace.variables).toEqual(['x', 'y']);
    expect(trace.points).toHaveLength(50);
    trace.points.forEach(([x, y], k) => {
      const t = trace.times[k]!;
      expect(Math.abs(x! - Math.cos(t))).toBeLessThan(1e-14);
      expect(Math.abs(y! - Math.sin(t))).toBeLessThan(1e-14);
    });
    expect(trace.times[0]).toBe(0);
    expect(trace.times.at(-1)).toBeCloseTo(2 * Math.PI, 14);
    expect(trace.closes).toBe(true);
  });

  it('goes through the crossings that it is given', () => {
    const crossings = [
      { time: '0.7793261053580874', point: ['13.763610682134', '19.578751942452', '27'] },
      { time: '1.5586522107161747', point: ['-13.763610682134', '-19.578751942452', '27'] },
    ];
    const trace = traceOrbit(lorenz, { ...LORENZ_AB, crossings }, 401)!;
    expect(trace.crossings[0]).toEqual({ time: 0.7793261053580874, point: [13.763610682134, 19.578751942452, 27] });
    const nearest = Math.min(...trace.points.map(([x, y, z]) => Math.hypot(x! - 13.7636, y! - 19.5788, z! - 27)));
    // 401 points over 53 steps of an orbit of length about 170.
    expect(nearest).toBeLessThan(1);
    expect(trace.closes).toBe(true);
  });

  it('says when the line does not close', () => {
    const trace = traceOrbit(circle, { section: { formula: 'y' }, point: ['1', '0'], period: '3' }, 10)!;
    expect(trace.closes).toBe(false);
  });

  it('is null for a body that cannot be read and refuses 1 point', () => {
    expect(traceOrbit(circle, { section: { formula: 'y' }, point: ['1'], period: '3' }, 10)).toBeNull();
    expect(() => traceOrbit(circle, { section: { formula: 'y' }, point: ['1', '0'], period: '3' }, 1)).toThrow(
      RangeError,
    );
  });
});
