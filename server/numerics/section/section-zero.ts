/** A zero of the section's function u along an orbit. */
export interface SectionZero {
  /** Time since the start; `timeLow` is the part that a double cannot hold beside it. */
  time: number;
  timeLow: number;
  state: Float64Array;
  /** 1 where u rises through zero, −1 where it falls, 0 where it touches or cannot be resolved. */
  direction: 1 | -1 | 0;
}

/** A local extremum of u that comes near zero. */
export interface NearMiss {
  time: number;
  state: Float64Array;
  /** u there. */
  value: number;
  /** d²u/dt² there. */
  curvature: number;
}
