import { accessionOf, checkCharacter, readAccession } from '@/server/services/accession';

describe('accessionOf', () => {
  it.each([
    [17, 'RTN-00000175'],
    [1, 'RTN-0000001X'],
  ])('numbers entry %d as %s', (number, accession) => {
    expect(accessionOf(number)).toBe(accession);
  });

  it.each([0, -1, 1.5, 10_000_000, NaN])('refuses %d', (number) => {
    expect(() => accessionOf(number)).toThrow(RangeError);
  });
});

describe('checkCharacter', () => {
  // ISO 7064 MOD 11-2 is the check of ORCID iDs; this one is ORCID's own published example.
  it('gives the check character of a published ORCID iD', () => {
    expect(checkCharacter('000000021825009')).toBe('7');
  });

  it('notices every single wrong digit and every swap of neighbours', () => {
    const digits = '0000417';
    const right = checkCharacter(digits);
    for (let place = 0; place < digits.length; place += 1) {
      for (const other of '0123456789') {
        const wrong = digits.slice(0, place) + other + digits.slice(place + 1);
        if (wrong !== digits) expect(checkCharacter(wrong)).not.toBe(right);
      }
      const swapped = digits.slice(0, place) + (digits[place + 1] ?? '') + digits[place]! + digits.slice(place + 2);
      if (swapped !== digits) expect(checkCharacter(swapped)).not.toBe(right);
    }
  });
});

describe('readAccession', () => {
  it('forgives small letters, blanks around and a missing hyphen', () => {
    expect(readAccession(' rtn0000001x ')).toEqual({ ok: true, accession: 'RTN-0000001X' });
  });

  it('names the right one when the check character is wrong', () => {
    expect(readAccession('RTN-00000171')).toEqual({ ok: false, reason: 'check-character', right: 'RTN-00000175' });
  });

  it.each(['', 'RTN-', 'RTN-123', '00000175', 'RTN-000000175', 'ABC-00000175'])('does not read %s', (typed) => {
    expect(readAccession(typed)).toEqual({ ok: false, reason: 'form' });
  });
});
