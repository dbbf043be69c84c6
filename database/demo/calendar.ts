const dayLength = 24 * 60 * 60 * 1000;

/** The demo's days, counted back from the day it is seeded on, so that its season has just been. */
export class Calendar {
  private readonly today: number;

  constructor(now: Date) {
    this.today = Math.floor(now.getTime() / dayLength) * dayLength;
  }

  /** An hour (UTC) of a day so many days ago; from 1 on nothing of it lies in the future. */
  at(daysAgo: number, hour: number, seconds = 0): Date {
    return new Date(this.today - daysAgo * dayLength + (hour * 3600 + seconds) * 1000);
  }

  /** A day in so many days, year-month-day. */
  dayIn(days: number): string {
    return this.at(-days, 0).toISOString().slice(0, 10);
  }
}
