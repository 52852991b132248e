import { reportMusic } from '@/features/checking/report-music';
import { reportAB } from '../../support/desk-fixtures';
import { lorenzSystem, traceAB } from '../../support/lorenz-fixtures';

const shared = { system: lorenzSystem, section: 'z-27', trace: traceAB } as const;

describe('reportMusic', () => {
  it('draws the orbit that closes, with its multipliers', () => {
    const music = reportMusic({ ...shared, report: reportAB, state: 'closes' });
    expect(music).toMatchObject({ coordinate: 'x', multipliers: reportAB.orbit?.multipliers });
    expect(music?.end).toBeUndefined();
  });

  it('draws the run as typed where the orbit found is only a neighbour: no multipliers, and where it ended', () => {
    const report = { ...reportAB, verdict: 'does-not-close' } as const;
    const music = reportMusic({ ...shared, report, state: 'does-not-close' });
    expect(music?.multipliers).toBeNull();
    expect(music?.end).toEqual({ time: traceAB.times.at(-1), value: traceAB.points.at(-1)?.[0] });
  });

  it('draws nothing before the run is known', () => {
    const report = { ...reportAB, verdict: 'does-not-close', orbit: null } as const;
    expect(reportMusic({ system: lorenzSystem, section: 'z-27', report, state: 'does-not-close' })).toBeNull();
  });
});
