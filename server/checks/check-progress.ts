/** What a running check is doing. */
export interface CheckProgress {
  phase: 'integrating' | 'correcting' | 'measuring' | 'comparing';
  /** Time reached of the period, in the first phase. */
  time: number;
  period: number;
  /** Counted crossings and all zeros of u so far. */
  returns: number;
  crossings: number;
  /** Newton step, from the second phase on. */
  iteration: number;
}
