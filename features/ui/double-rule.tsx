import { View } from 'react-native';
import { colour } from './tokens';

/** Thick over thin: once a page, under its heading. */
export function DoubleRule() {
  return (
    <View
      aria-hidden
      style={{ height: 7, borderTopWidth: 2.5, borderBottomWidth: 1, borderColor: colour.ink, borderStyle: 'solid' }}
    />
  );
}
