import { NewtonLog } from '@/server/numerics/periodic/newton-log';

/** A log of corrections of these sizes. */
function logOf(sizes: number[], isRounding = false): NewtonLog {
  const log = new NewtonLog();
  sizes.forEach((size, i) => log.add({ size, inside: size, isRounding: isRounding && i === sizes.length - 1 }));
  return log;
}

describe('NewtonLog', () => {
  it('is settled by a correction below 1e-10, or one that only follows rounding', () => {
    expect(logOf([1e-3, 1e-7]).isSettled()).toBe(false);
    expect(logOf([1e-3, 1e-7, 9e-11]).isSettled()).toBe(true);
    expect(logOf([1e-3, 1e-7], true).isSettled()).toBe(true);
    expect(logOf([]).isSettled()).toBe(false);
  });

  it('judges the rate on corrections above 1e-10 alone', () => {
    expect(logOf([1e-11, 9e-12]).fellFast()).toBe(true);
    expect(logOf([1e-3, 1e-6, 1e-12]).fellFast()).toBe(true);
    expect(logOf([1e-3, 5e-4, 2.5e-4]).fellFast()).toBe(false);
    expect(logOf([2e-10, 1e-10]).fellFast()).toBe(false);
  });

  it('gives up when seven corrections did not halve the smallest', () => {
    expect(logOf([1, 0.9, 0.9, 0.8, 0.8, 0.7, 0.7]).wandersOff()).toBe(true);
    expect(logOf([1, 0.9, 0.9, 0.8, 0.8, 0.7, 0.4]).wandersOff()).toBe(false);
    expect(logOf([1, 0.9, 0.9, 0.8, 0.8, 0.7]).wandersOff()).toBe(false);
  });

  it('compares the second correction with the first, unless that was rounding', () => {
    expect(logOf([1e-2, 1e-4, 1e-8]).basinRatio()).toBe(1e-2);
    expect(logOf([1e-11, 1e-12]).basinRatio()).toBeNull();
    expect(logOf([1e-2]).basinRatio()).toBeNull();
  });
});
