/** A picture needs no more digits than a large screen shows. */
const SIGNIFICANT_DIGITS = 6;

/** A figure rounded for drawing, so that its decimal text is short. */
export const forDrawing = (value: number): number => Number(value.toPrecision(SIGNIFICANT_DIGITS));
