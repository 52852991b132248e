import brygada from '@/assets/fonts/Brygada1918-400.woff2';
import brygadaItalic from '@/assets/fonts/Brygada1918-400-italic.woff2';
import brygadaSemibold from '@/assets/fonts/Brygada1918-600.woff2';
import iosevka from '@/assets/fonts/Iosevka-400.woff2';
import iosevkaSemibold from '@/assets/fonts/Iosevka-600.woff2';

/** What `useFonts` of expo-font loads: family name → file. */
export const fontFiles = {
  Brygada: brygada,
  'Brygada Italic': brygadaItalic,
  'Brygada Semibold': brygadaSemibold,
  Iosevka: iosevka,
  'Iosevka Semibold': iosevkaSemibold,
};
