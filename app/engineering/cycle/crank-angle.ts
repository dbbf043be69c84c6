/** One degree in rad. */
export const degrees = Math.PI / 180;

/** Crank angle of one four-stroke cycle, rad. */
export const engineCycleAngle = 4 * Math.PI;
