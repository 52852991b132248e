/** A point of a section, in the two coordinates that are drawn. */
export type PlanePoint = readonly [number, number];
