/** Colours by name; the value follows the theme. They work in styles and as SVG paint. */
export const colour = {
  page: 'var(--page)',
  card: 'var(--card)',
  well: 'var(--well)',
  ink: 'var(--ink)',
  muted: 'var(--ink-muted)',
  faint: 'var(--ink-faint)',
  verdigris: 'var(--verdigris)',
  ochre: 'var(--ochre)',
  oxide: 'var(--oxide)',
  indigo: 'var(--indigo)',
  staff: 'var(--staff)',
  hairline: 'var(--hairline)',
} as const;

/** Text colours. */
export type Tone = 'ink' | 'muted' | 'faint' | 'verdigris' | 'ochre' | 'oxide' | 'indigo' | 'page';

/** Lines of one plot, in this order; at most four. */
export const series = ['var(--series-1)', 'var(--series-2)', 'var(--series-3)', 'var(--series-4)'] as const;

/** The unit of every distance, px. */
export const staffSpace = 8;

/** Distances in staff spaces. */
export const space = { half: 4, one: 8, oneHalf: 12, two: 16, three: 24, four: 32, six: 48, eight: 64 } as const;

/** Smallest side of anything that is touched, px. */
export const touchTarget = 44;

/** Font families. Each weight is a family of its own, so that no browser makes up a bold or an italic. */
export const font = {
  reading: 'Brygada, Iosevka, Georgia, serif',
  readingItalic: '"Brygada Italic", Iosevka, Georgia, serif',
  readingSemibold: '"Brygada Semibold", Iosevka, Georgia, serif',
  number: 'Iosevka, ui-monospace, monospace',
  numberSemibold: '"Iosevka Semibold", ui-monospace, monospace',
} as const;

/** Text sizes, px. */
export type TextSize = 11 | 13 | 14 | 16 | 19 | 23 | 26 | 28 | 34;

/** Widths of the container at which the layout changes, px. */
export const breakpoint = { middle: 640, wide: 1080 } as const;

/** Widest content, px. */
export const contentWidth = 1312;
