/** The speed a journal takes under a load, without units: along the load and 90° ahead of it. */
export interface MobilityVector {
  along: number;
  across: number;
}

// Rounding may put a trial place on the wall; a hair of film is left so that the journal can come off it again.
const leastGap = 1e-12;

/** The gap a load presses on, over the radial clearance, for a journal `along` clearances towards the load. */
export const openGap = (along: number): number => Math.max(leastGap, 1 - along);

/**
 * Moes' mobility of a finite bearing: the sum of a short bearing's (Booker's fit) and a long one's. `along` and
 * `across` are the journal's eccentricity ratios along the load and 90° ahead of it.
 * Expected error: a few per cent to ε 0.6, but up to 60 % too fast at ε 0.98 with the load square to the motion.
 * Source: D. Childs, H. Moes, H. van Leeuwen, J. Lubrication Technology 99 (1977) 198–210 (from memory; it tends
 * to Booker's fit for a short bearing, and its errors are those against our own Reynolds solution).
 */
export function moesMobility(along: number, across: number, lengthToDiameter: number): MobilityVector {
  const slenderness = 1 / (lengthToDiameter * lengthToDiameter);
  const gap = openGap(along);
  const root = Math.sqrt(gap);
  return {
    along: gap * root * (0.15 + (slenderness / Math.PI) * gap),
    across: -across * root * (0.1125 + ((4 * slenderness) / Math.PI ** 2) * gap),
  };
}
