import { roundDecimal } from '@/tests/reference/round-decimal';

describe('roundDecimal', () => {
  it.each([
    ['1.55865221071617472756787020921269607052848', '1.5586522107161747'],
    ['-19.5787519424517955388380414460095588661142', '-19.578751942451796'],
    ['0.0295900606306671029514940277353747670753823', '0.029590060630667103'],
    ['0.99999999999999999999', '1.00000000000000000'],
    ['27', '27'],
  ])('rounds %s to 17 significant digits', (text, rounded) => {
    expect(roundDecimal(text, 17)).toBe(rounded);
  });

  it.each([
    ['0.5', '0.5'],
    ['2.25', '2.2'],
    ['2.35', '2.4'],
    ['2.251', '2.3'],
  ])('rounds a tie to the even neighbour: %s', (text, rounded) => {
    expect(roundDecimal(text, 2)).toBe(rounded);
  });

  it.each(['NaN', '', '1e', '3/5', '0x10', '--1', '1,5', '123456'])(
    'leaves alone what has no places to drop: %j',
    (text) => {
      expect(roundDecimal(text, 2)).toBe(text);
    },
  );

  it('gives the double nearest to the whole decimal', () => {
    const text = '5.43679543926018996897964057449404294367429';
    expect(Number(roundDecimal(text, 17))).toBe(Number(text));
  });
});
