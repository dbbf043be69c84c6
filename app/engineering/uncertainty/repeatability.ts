/** A standard deviation of single readings and how well it is known. */
export interface Repeatability {
  standardDeviation: number;
  degreesOfFreedom: number;
}

/**
 * Scatter of a gauge from groups of repeats, each group at a place of its own: the groups' variances weighted by
 * their degrees of freedom (JCGM 100:2008, 4.2 and H.3.6); `undefined` where nothing was repeated.
 * @param groups readings in one unit, m for lengths
 */
export function repeatabilityOf(groups: readonly (readonly number[])[]): Repeatability | undefined {
  let squares = 0;
  let degreesOfFreedom = 0;
  for (const group of groups) {
    if (group.length < 2) continue;
    const mean = group.reduce((sum, value) => sum + value, 0) / group.length;
    squares += group.reduce((sum, value) => sum + (value - mean) ** 2, 0);
    degreesOfFreedom += group.length - 1;
  }
  if (degreesOfFreedom === 0) return undefined;
  return { standardDeviation: Math.sqrt(squares / degreesOfFreedom), degreesOfFreedom };
}

/**
 * What two sources say of one scatter, each with the weight of its degrees of freedom: a gauge's study, and the
 * repeats of the day. Two readings that happen to agree do not make a gauge perfect.
 */
export function pooled(one: Repeatability, other: Repeatability): Repeatability {
  const degreesOfFreedom = one.degreesOfFreedom + other.degreesOfFreedom;
  const squares =
    one.standardDeviation ** 2 * one.degreesOfFreedom + other.standardDeviation ** 2 * other.degreesOfFreedom;
  return { standardDeviation: Math.sqrt(squares / degreesOfFreedom), degreesOfFreedom };
}
