import { act } from '@testing-library/react';

/** Give the window of a test a width, px; without one, jsdom has none. */
export function windowWidth(px: number): void {
  Object.defineProperty(document.documentElement, 'clientWidth', { configurable: true, value: px });
  act(() => {
    window.dispatchEvent(new Event('resize'));
  });
}
