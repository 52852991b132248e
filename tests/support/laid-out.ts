import { act } from '@testing-library/react';

type Tell = (entries: { target: Element }[]) => void;

/** jsdom lays nothing out: let every element that is observed report this width, px. Call before the first render of a file. */
export function laidOut(width: number): void {
  Object.defineProperty(HTMLElement.prototype, 'offsetWidth', { configurable: true, value: width });
  class Observer {
    constructor(private readonly tell: Tell) {}
    observe(target: Element) {
      this.tell([{ target }]);
    }
    unobserve() {
      return undefined;
    }
    disconnect() {
      return undefined;
    }
  }
  Object.assign(window, { ResizeObserver: Observer });
}

/** Let what was reported arrive. */
export const settled = (): Promise<void> => act(() => new Promise<void>((resolve) => setTimeout(resolve, 10)));
