/**
 * The regularised incomplete beta function I_x(a, b), from which Student's t and the F ratio follow.
 * Continued fraction (NIST Digital Library of Mathematical Functions, 8.17.22) by Lentz's method, on the side where it
 * converges fast. Relative error about 1e-12, 1e-9 where a or b nears a million.
 * @param x 0 to 1
 * @param a over zero
 * @param b over zero
 */
export function incompleteBeta(x: number, a: number, b: number): number {
  if (x <= 0) return 0;
  if (x >= 1) return 1;
  if (x > (a + 1) / (a + b + 2)) return 1 - incompleteBeta(1 - x, b, a);
  const front = Math.exp(a * Math.log(x) + b * Math.log1p(-x) + logGamma(a + b) - logGamma(a) - logGamma(b));
  return front / (a * fraction(x, a, b));
}

const tiny = 1e-300;
const mostTerms = 500;

function fraction(x: number, a: number, b: number): number {
  let numerator = 1;
  let denominator = 0;
  let value = 1;
  for (let term = 1; term <= mostTerms; term++) {
    const coefficient = coefficientOf(term, x, a, b);
    denominator = 1 / away(1 + coefficient * denominator);
    numerator = away(1 + coefficient / numerator);
    const change = numerator * denominator;
    value *= change;
    if (Math.abs(change - 1) < 1e-15) break;
  }
  return value;
}

const away = (value: number): number => (Math.abs(value) < tiny ? tiny : value);

function coefficientOf(term: number, x: number, a: number, b: number): number {
  const m = term >> 1;
  return term % 2 === 0
    ? (m * (b - m) * x) / ((a + 2 * m - 1) * (a + 2 * m))
    : (-(a + m) * (a + b + m) * x) / ((a + 2 * m) * (a + 2 * m + 1));
}

// Lanczos's approximation with g = 7 and nine terms (P. Godfrey's coefficients): relative error under 1e-15.
const lanczos = [
  0.99999999999980993, 676.5203681218851, -1259.1392167224028, 771.32342877765313, -176.61502916214059,
  12.507343278686905, -0.13857109526572012, 9.9843695780195716e-6, 1.5056327351493116e-7,
] as const;

/** The logarithm of the gamma function, for z over zero. */
export function logGamma(z: number): number {
  if (z < 0.5) return Math.log(Math.PI / Math.sin(Math.PI * z)) - logGamma(1 - z);
  const shifted = z - 1;
  const t = shifted + 7.5;
  const series = lanczos.reduce(
    (sum, term, index) => sum + (index === 0 ? term : term / (shifted + index)),
    0,
  );
  return 0.5 * Math.log(2 * Math.PI) + (shifted + 0.5) * Math.log(t) - t + Math.log(series);
}
