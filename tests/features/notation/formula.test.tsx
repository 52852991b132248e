import { render, screen } from '@testing-library/react';
import { Formula } from '@/features/notation/formula';
import { formulaTokens } from '@/features/notation/formula-tokens';

const line = (formula: string) =>
  formulaTokens(formula)
    .map(({ text }) => text)
    .join('');

describe('formulaTokens', () => {
  it.each([
    ['z - 27', 'z − 27'],
    ['rho*x - y - x*z', 'ρx − y − xz'],
    ['-x', '−x'],
    ['sqrt(x1*y)', 'sqrt(x₁y)'],
    ['x^2 + 2*pi', 'x² + 2π'],
    ['x*2', 'x·2'],
    ['mass*x', 'mass\u2009x'],
    ['(a)*(-b)', '(a)(−b)'],
  ])('sets %s', (formula, text) => {
    expect(line(formula)).toBe(text);
  });

  it('sets variables italic, and neither digits nor functions', () => {
    expect(
      formulaTokens('sin(x) + 2')
        .filter(({ italic }) => italic)
        .map(({ text }) => text),
    ).toEqual(['x']);
  });
});

describe('Formula with MathML', () => {
  it('draws known elements and drops scripts, handlers and links', () => {
    const mathml =
      '<math><mi onclick="x()" href="javascript:x()" mathvariant="normal">z</mi><script>x()</script></math>';
    const { container } = render(<Formula text="z" mathml={mathml} />);
    const drawn = screen.getByLabelText('z');
    expect(drawn.innerHTML).toBe('<math><mi mathvariant="normal">z</mi></math>');
    expect(container.querySelector('script')).toBeNull();
  });

  it('shows the plain text when the MathML cannot be read', () => {
    render(<Formula text="z - 27" mathml="<math><mi>" />);
    expect(screen.getByText('z - 27')).toBeTruthy();
  });
});
