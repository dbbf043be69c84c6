/** A stream of random numbers that a seed fixes (mulberry32, by Tommy Ettinger, public domain). */
export class Random {
  private state: number;

  constructor(seed: number) {
    this.state = seed >>> 0;
  }

  /** Evenly between 0 and 1. */
  unit(): number {
    this.state = (this.state + 0x6d2b79f5) >>> 0;
    let mixed = this.state;
    mixed = Math.imul(mixed ^ (mixed >>> 15), mixed | 1);
    mixed ^= mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61);
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 2 ** 32;
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

  pick<T>(items: readonly T[]): T {
    return items[Math.floor(this.unit() * items.length)]!;
  }

  /** Normal, by Box and Muller. */
  normal(standardDeviation: number): number {
    const radius = Math.sqrt(-2 * Math.log(1 - this.unit()));
    return standardDeviation * radius * Math.cos(2 * Math.PI * this.unit());
  }
}
