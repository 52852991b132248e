import { verifiedDigits } from '@/features/orbit/verified-digits';

describe('verifiedDigits', () => {
  it('is all that were confirmed for a coordinate of the size of the orbit', () => {
    expect(verifiedDigits('-13.76', [-16, 16], 15)).toBe(14);
    expect(verifiedDigits('40', [-16, 16], 15)).toBe(15);
  });

  it('is fewer where a coordinate is small beside the orbit, and none where it is rounding', () => {
    expect(verifiedDigits('1e-6', [-0.5, 0.5], 15)).toBe(9);
    expect(verifiedDigits('-3.6e-60', [-0.5, 0.5], 14)).toBe(0);
  });

  it('does not judge a zero or a coordinate that does not move', () => {
    expect(verifiedDigits('0', [-1, 1], 15)).toBe(15);
    expect(verifiedDigits('0.25', [0.25, 0.25], 15)).toBe(15);
  });
});
