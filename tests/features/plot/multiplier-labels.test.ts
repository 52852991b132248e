import { multiplierLabels } from '@/features/plot/multiplier-labels';
import { unitCirclePosition } from '@/features/notation/unit-circle-position';

const frame = { width: 384, height: 276, x: 192, y: 138, radius: 64 };

const placed = (...values: (readonly [re: string, im?: string])[]) =>
  values.map(([re, im = '0']) => {
    const multiplier = { re, im };
    const { x, y } = unitCirclePosition(multiplier);
    return { multiplier, x: frame.x + x * frame.radius, y: frame.y - y * frame.radius };
  });
const texts = (labels: readonly { text: string }[]) => labels.map(({ text }) => text);

/** The figure eight of three equal masses: two pairs on the circle, seven that a family keeps at 1 (tests/reference/cases.json). */
const eight = placed(
  ...Array.from({ length: 7 }, () => ['1'] as const),
  ['0.998599982', '0.052896849'],
  ['0.998599982', '-0.052896849'],
  ['-0.297596667', '0.954691698'],
  ['-0.297596667', '-0.954691698'],
);

describe('the labels of multipliers', () => {
  it('never cover each other, however close the multipliers', () => {
    const labels = multiplierLabels(eight, frame);
    expect(labels.length).toBeGreaterThanOrEqual(3);
    for (const [i, one] of labels.entries()) {
      for (const other of labels.slice(i + 1)) {
        // Iosevka at 13 px: 6.5 px a character, 13 px from line to line.
        const halves = (6.5 * (one.text.length + other.text.length)) / 2;
        expect(Math.abs(one.x - other.x) >= halves || Math.abs(one.y - other.y) >= 13).toBe(true);
      }
    }
  });

  it('name multipliers that coincide once, and both of a pair together', () => {
    const found = texts(multiplierLabels(eight, frame));
    expect(found).toContain('1, seven times');
    expect(found).toContain('−0.297597 ± 0.954692i');
    expect(found.filter((text) => text.startsWith('−0.297597'))).toHaveLength(1);
  });

  it('do not take close multipliers for equal ones', () => {
    // 0.563 and 1 are drawn less than three pixels apart.
    expect(texts(multiplierLabels(placed(['1'], ['0.5631394517'], ['1']), frame))).toEqual(
      expect.arrayContaining(['1, twice', '0.563139']),
    );
  });

  it('have a line to their dot where they stand away from it', () => {
    const away = multiplierLabels(eight, frame).filter(({ leader }) => leader !== null);
    expect(away.length).toBeGreaterThan(0);
    const dots = eight.map(({ x, y }) => ({ x, y }));
    for (const { leader } of away) expect(dots).toContainEqual(leader![0]);
  });

  it('say beside a real one on which side of the circle it is', () => {
    expect(texts(multiplierLabels(placed(['349.594227'], ['6.0933e-43']), frame))).toEqual([
      '349.594',
      '6.0933·10⁻⁴³',
      'unstable',
      'stable',
    ]);
  });

  it('stay inside the picture', () => {
    for (const { x, text } of multiplierLabels(placed(['-1e9'], ['1e9'], ['0.3', '0.4'], ['0.3', '-0.4']), frame)) {
      expect(x - 3.25 * text.length).toBeGreaterThan(0);
      expect(x + 3.25 * text.length).toBeLessThan(frame.width);
    }
  });
});
