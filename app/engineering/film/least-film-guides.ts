import { requireWithin } from "../cycle/sound-input";

/** A published least film to hold a calculated one against. */
export interface LeastFilmGuide {
  name: string;
  /** m. */
  leastFilm: number;
  source: string;
  /** True where the figures were not seen in print: to show with that said, and not to decide by. */
  doubtful: boolean;
}

/**
 * Published least films for a journal diameter, m, and surface speed, m/s; a guide that does not reach the diameter is
 * left out. They are for industrial bearings with ground journals, finer finishes run with less.
 * @throws EngineeringError `not-a-number`, `not-positive`, `outside-range`
 */
export function leastFilmGuides({
  diameter,
  surfaceSpeed,
}: {
  diameter: number;
  surfaceSpeed: number;
}): LeastFilmGuide[] {
  requireWithin(diameter, "diameter", { from: 1e-3, to: 2.5, unit: "m" });
  requireWithin(surfaceSpeed, "surfaceSpeed", { from: 0, to: 1e4, unit: "m/s" });
  const row = hydrodynamicRows.find(({ from, to }) => diameter > from && diameter <= to);
  return [
    {
      name: "Trumpler",
      leastFilm: 5.08e-6 + 4e-5 * diameter,
      source: "P. R. Trumpler, Design of Film Bearings (1966): 0.0002 in + 0.00004 d, as handbooks quote it",
      doubtful: false,
    },
    ...(row
      ? [
          {
            name: "ISO 7902-3",
            leastFilm: row.leastFilm[speedClasses.filter((limit) => surfaceSpeed > limit).length]! / 1e6,
            source: "ISO 7902-3 / DIN 31652-3, from memory: the printed table was not seen",
            doubtful: true,
          },
        ]
      : []),
  ];
}

/** Upper ends of the classes of surface speed, m/s; the last class is open. */
const speedClasses = [1, 3, 10, 30];

/** Diameters over and up to, m, and the least film by class of speed, µm. */
const hydrodynamicRows = [
  { from: 0.024, to: 0.063, leastFilm: [3, 4, 5, 7, 10] },
  { from: 0.063, to: 0.16, leastFilm: [4, 5, 7, 9, 12] },
  { from: 0.16, to: 0.4, leastFilm: [6, 7, 9, 11, 14] },
  { from: 0.4, to: 1, leastFilm: [8, 9, 11, 13, 16] },
  { from: 1, to: 2.5, leastFilm: [10, 12, 14, 16, 18] },
];
