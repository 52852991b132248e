import { fireEvent, render, screen } from '@testing-library/react';
import { Incipit } from '@/features/notation/incipit';
import { incipitFlow } from '@/features/notation/incipit-flow';
import { incipitLayout } from '@/features/notation/incipit-layout';
import type { IncipitProps } from '@/features/notation/incipit-props';
import { incipitWords } from '@/features/notation/incipit-words';

const threeNotes: IncipitProps = {
  crossings: ['13.51', '-12.6', '13.9'],
  returnTimes: ['1', '2', '1'],
  levels: [16, 8, 0, -8, -16],
  multipliers: [{ re: '9.17', im: '0' }],
  state: 'closes',
  coordinate: 'x',
  space: 8,
  width: 326,
};
const manyNotes = (count: number): IncipitProps => ({
  ...threeNotes,
  crossings: Array.from({ length: count }, (_, i) => i),
  returnTimes: Array.from({ length: count }, () => 1),
});

describe('the text alternative of an incipit', () => {
  it('reads the crossings and the state', () => {
    expect(incipitWords(threeNotes)).toBe('three crossings, x = 13.5, −12.6, 13.9; closes');
  });

  it('reads twelve numbers at most and counts the rest', () => {
    expect(incipitWords(manyNotes(20))).toBe(
      '20 crossings, x = 0, 1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 11 and 8 more; closes',
    );
  });

  it('is the accessible name of the picture', () => {
    render(<Incipit {...threeNotes} />);
    expect(screen.getByRole('img', { name: 'three crossings, x = 13.5, −12.6, 13.9; closes' })).toBeTruthy();
  });
});

describe('incipitLayout', () => {
  it('spaces notes by return times and sets them at the height of the coordinate', () => {
    const { notes, yOf, xOf } = incipitLayout(threeNotes, 326);
    const [first, second, third] = notes;
    expect((third!.x - second!.x) / (second!.x - first!.x)).toBeCloseTo(2, 10);
    expect(yOf(16)).toBeCloseTo(8 * 1.6, 10);
    expect(yOf(-16)).toBeCloseTo(8 * 5.6, 10);
    expect(xOf(4)).toBeCloseTo(326 - 22, 10);
  });

  it('begins at the crossing asked for, with its letters and times', () => {
    const turned = incipitLayout({ ...threeNotes, letters: 'BAB', start: 1 }, 326);
    expect(turned.notes.map(({ crossing, letter }) => [crossing, letter])).toEqual([
      [1, 'A'],
      [2, 'B'],
      [0, 'B'],
    ]);
    expect(turned.origin).toBe(1);
    expect((turned.notes[1]!.x - turned.notes[0]!.x) / (turned.notes[2]!.x - turned.notes[1]!.x)).toBeCloseTo(2, 10);
  });

  it('draws the opening 32 of a longer orbit and says so in place of the bar', () => {
    const layout = incipitLayout(manyNotes(64), 326);
    expect(layout.notes).toHaveLength(32);
    expect(layout.cut?.text).toBe('first 32 of 64');
    expect(incipitLayout(manyNotes(32), 326).cut).toBeNull();
  });

  it('keeps noteheads between 0.58 and 1.3 staff spaces', () => {
    expect(incipitLayout(threeNotes, 1000).noteWidth).toBeCloseTo(1.3 * 8, 10);
    expect(incipitLayout(manyNotes(32), 220).noteWidth).toBeCloseTo(0.58 * 8, 10);
  });
});

describe('incipitFlow', () => {
  const flow = [
    [0, 3],
    [1, 3.1],
    [2, -3.1],
    [3, -3],
  ] as const;

  it('breaks where an angle jumps over its cut', () => {
    const props = { ...threeNotes, flow };
    const layout = incipitLayout(props, 326);
    expect(incipitFlow(props, layout).match(/M/g)).toHaveLength(1);
    expect(incipitFlow({ ...props, modulus: 2 * Math.PI }, layout).match(/M/g)).toHaveLength(2);
  });

  it('ends at the time that a running check has reached', () => {
    const props = { ...threeNotes, flow, upTo: 1.5 };
    expect(incipitFlow(props, incipitLayout(props, 326)).match(/[ML]/g)).toHaveLength(2);
  });
});

describe('an incipit in which one can select', () => {
  it('walks the crossings in time by the arrow keys, around the end', () => {
    const onSelect = jest.fn();
    const { rerender } = render(<Incipit {...threeNotes} selected={null} onSelect={onSelect} />);
    const walk = screen.getByRole('slider');
    fireEvent.keyDown(walk, { key: 'ArrowRight' });
    rerender(<Incipit {...threeNotes} selected={2} onSelect={onSelect} />);
    fireEvent.keyDown(walk, { key: 'ArrowRight' });
    fireEvent.keyDown(walk, { key: 'ArrowLeft' });
    expect(onSelect.mock.calls).toEqual([[0], [0], [1]]);
    expect(walk.getAttribute('aria-valuetext')).toBe('crossing 3, x = 13.9');
  });
});
