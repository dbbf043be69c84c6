/** The radial clearance, m, of a diametral one: the only place where one becomes the other. */
export const radial = (clearance: number): number => clearance / 2;
