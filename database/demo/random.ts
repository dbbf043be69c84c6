const modulus = 2 ** 31 - 1;
const multiplier = 48_271;

/**
 * A stream of random numbers that its seed fixes: the minimal standard generator
 * (S. K. Park, K. W. Miller, P. K. Stockmeyer, Communications of the ACM 36(7), 1993, multiplier 48271).
 */
export class Random {
  private state: number;

  /** @param seed a whole number from 1 to 2^31 − 2 */
  constructor(seed: number) {
    this.state = seed;
  }

  /** A stream of its own for a name, so that what is drawn for one fit moves nothing of another. */
  static named(name: string): Random {
    const seed = [...name].reduce((sum, letter) => (sum * 131 + letter.codePointAt(0)!) % modulus, 1);
    const random = new Random(seed || 1);
    // Names alike have seeds alike; a few draws on their streams have nothing in common.
    for (let draw = 0; draw < 8; draw++) random.next();
    return random;
  }

  /** The next whole number of the stream, 1 to 2^31 − 2. */
  next(): number {
    this.state = (this.state * multiplier) % modulus;
    return this.state;
  }

  /** Evenly between 0 and 1, neither of them. */
  unit(): number {
    return this.next() / modulus;
  }

  between([least, most]: readonly [number, number]): number {
    return least + (most - least) * this.unit();
  }

  whole([least, most]: readonly [number, number]): number {
    return Math.floor(this.between([least, most + 1]));
  }

  chance(probability: number): boolean {
    return this.unit() < probability;
  }

  /** Normal about zero, by Box and Muller. */
  normal(standardDeviation: number): number {
    const radius = Math.sqrt(-2 * Math.log(this.unit()));
    return standardDeviation * radius * Math.cos(2 * Math.PI * this.unit());
  }
}
