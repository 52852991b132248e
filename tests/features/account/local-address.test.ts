import { localAddress } from '@/features/account/local-address';

describe('localAddress', () => {
  it('leads to a page of this site', () => {
    expect(localAddress('/bench?system=lorenz')).toBe('/bench?system=lorenz');
  });

  it.each(['', 'https://elsewhere.example', '//elsewhere.example', '/\\elsewhere.example', 'javascript:alert(1)'])(
    'leads to the Desk in place of %j',
    (next) => {
      expect(localAddress(next)).toBe('/desk');
    },
  );
});
