import { niceTicks } from "./scale";

const steps = [1, 1.5, 2, 3, 4, 5, 7] as const;

/**
 * Round films (m) inside the range of these, about `count` of them: evenly spaced by ratio where the range is wide,
 * evenly spaced where it is narrow.
 */
export function filmLevels(films: readonly number[], count: number): number[] {
  const positive = films.filter((film) => film > 0);
  if (positive.length === 0) return [];
  const least = positive.reduce((a, b) => Math.min(a, b));
  const most = positive.reduce((a, b) => Math.max(a, b));
  if (most < 3 * least) return niceTicks(least, most, count).filter((level) => level > least && level < most);
  const levels: number[] = [];
  for (let power = Math.floor(Math.log10(least)); power <= Math.log10(most); power++) {
    for (const step of steps) {
      const level = Number(`${step}e${power}`);
      if (level > least && level < most) levels.push(level);
    }
  }
  const every = Math.ceil(levels.length / count);
  return levels.filter((_, index) => index % every === 0);
}

/** A film in µm, whatever the page's unit: films are spoken of in µm everywhere. */
export function filmText(film: number): string {
  const micrometres = film * 1e6;
  return `${micrometres < 9.95 ? micrometres.toFixed(1) : micrometres.toFixed(0)} µm`;
}
