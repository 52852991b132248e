import { render, screen } from '@testing-library/react';
import { Completeness } from '@/features/notation/completeness';
import { Digits } from '@/features/notation/digits';
import { FindingRow } from '@/features/notation/finding-row';
import { Verdict } from '@/features/notation/verdict';
import { Text } from '@/features/ui';

const textOf = (container: HTMLElement) => container.textContent.replaceAll(/\s+/g, ' ').trim();

describe('Completeness', () => {
  const lorenz = { system: 'Lorenz', parameters: { sigma: '10', rho: '28', beta: '8/3' } };

  it.each([
    [
      'everything is there',
      { known: 745, allowed: 745, upTo: 12 },
      'Complete for Lorenz with σ 10, ρ 28, β 8/3 up to 12 returns: 745 of 745 orbits that its itineraries allow.',
    ],
    [
      'some are missing',
      { known: 747, allowed: 1375, upTo: 13 },
      '747 of 1,375 orbits that its itineraries allow up to 13 returns.',
    ],
    ['the count is not known', { known: 12, allowed: null, upTo: null }, '12 orbits; how many there are is not known.'],
  ])('says what is known when %s', (_, counts, sentence) => {
    const { container } = render(<Completeness {...lorenz} {...counts} />);
    expect(textOf(container)).toBe(sentence);
  });
});

describe('FindingRow', () => {
  it('says severity, code, sentence, and how the value stands to its limit', () => {
    const { container } = render(
      <FindingRow
        severity="blocker"
        code="tangent-crossing"
        message="The third crossing is tangent."
        value={3.1e-8}
        limit={1e-6}
      />,
    );
    expect(textOf(container)).toBe('blockertangent-crossingThe third crossing is tangent.3.1·10⁻⁸ < 10⁻⁶');
  });

  it('shows no figures where there are none', () => {
    const { container } = render(
      <FindingRow severity="note" code="stiff" message="Stiff." value={null} limit={null} />,
    );
    expect(textOf(container)).toBe('notestiffStiff.');
  });
});

describe('Verdict', () => {
  it('is a heading and a sentence', () => {
    render(<Verdict verdict="does-not-close" sentence={<Text>Nothing has been sent.</Text>} />);
    expect(screen.getByRole('heading', { level: 2, name: 'Does not close' })).toBeTruthy();
    expect(screen.getByText('Nothing has been sent.')).toBeTruthy();
  });
});

describe('Digits', () => {
  it('rules the verified digits and only those', () => {
    const { container } = render(<Digits value="-6.6839408" verified={5} />);
    const ruled = [...container.querySelectorAll<HTMLElement>('span span')].filter(
      (run) => run.style.borderBottomWidth === '2px',
    );
    expect(ruled.map((run) => run.textContent).join('')).toBe('−6.6839');
    expect(container.textContent).toBe('−6.6839408');
  });

  it('sets an exponent after the digits', () => {
    const { container } = render(<Digits value="6.0933e-43" />);
    expect(container.textContent).toBe('6.0933·10⁻⁴³');
  });
});
