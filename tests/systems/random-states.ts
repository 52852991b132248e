/** Reproducible states with every coordinate between 0.3 and 2, where all fields under test are defined. */
export function randomStates(dimension: number, count: number): number[][] {
  let seed = 20_011;
  // Numerical Recipes' "quick and dirty" generator: any spread of points will do.
  const next = () => {
    seed = (seed * 1_664_525 + 1_013_904_223) % 2 ** 32;
    return 0.3 + (1.7 * seed) / 2 ** 32;
  };
  return Array.from({ length: count }, () => Array.from({ length: dimension }, next));
}
