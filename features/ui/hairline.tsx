import { View } from 'react-native';
import { colour } from './tokens';

/** The rule between rows. */
export function Hairline() {
  return <View aria-hidden style={{ height: 1, backgroundColor: colour.hairline }} />;
}
