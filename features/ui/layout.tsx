import { createContext, type ReactNode, useContext, useState } from 'react';
import { useWindowDimensions, View } from 'react-native';
import { breakpoint } from './tokens';

/** How much room there is: one column, two, or a page of columns. */
export type Layout = 'phone' | 'middle' | 'wide';

interface Measured {
  layout: Layout;
  width: number;
}

const LayoutContext = createContext<Measured | null>(null);

const layoutOf = (width: number): Layout =>
  width < breakpoint.middle ? 'phone' : width < breakpoint.wide ? 'middle' : 'wide';

function useMeasured(): Measured {
  const measured = useContext(LayoutContext);
  const { width } = useWindowDimensions();
  return measured ?? { layout: layoutOf(width), width };
}

/** Layout of the nearest container; without one, of the window. */
export const useLayout = (): Layout => useMeasured().layout;

/** Width of the nearest container in px; without one, of the window. */
export const useContainerWidth = (): number => useMeasured().width;

/** A part of a page that lays itself out by its own width. */
export function LayoutContainer({ children }: { children: ReactNode }) {
  const [width, setWidth] = useState<number | null>(null);
  return (
    <View onLayout={(event) => setWidth(event.nativeEvent.layout.width)}>
      {width === null ? null : (
        <LayoutContext.Provider value={{ layout: layoutOf(width), width }}>{children}</LayoutContext.Provider>
      )}
    </View>
  );
}
