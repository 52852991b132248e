/** One segment of a periodic orbit: between two shooting nodes. */
interface PlannedSegment {
  /** Borders of its pieces as shares of the period, ascending; the first is the segment's start, the last its end. */
  borders: number[];
}

/** How a periodic orbit is cut: segments between nodes, and pieces inside them whose derivatives are kept apart. */
export type ShootingPlan = PlannedSegment[];
