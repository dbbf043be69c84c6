import { EngineeringError } from "../engineering-error";

/** One reading of a gauge study. */
export interface StudyReading {
  part: string;
  person: string;
  trial: string;
  /** In the unit of the tolerance; m for lengths. */
  value: number;
}

/** What a gauge study finds, as standard deviations in the readings' unit. */
export interface StudyDeviations {
  /** Same person, same part: the gauge. */
  repeatability: number;
  /** Between people. */
  reproducibility: number;
  /** Both together. */
  gauge: number;
  partToPart: number;
  total: number;
}

/** The readings of a study in order: `values[person][part][trial]`. */
export interface StudyTable {
  people: string[];
  parts: string[];
  trials: string[];
  values: number[][][];
}

/** Sorts readings into a full table of person, part and trial. @throws EngineeringError as `gaugeStudy` */
export function studyTable(readings: readonly StudyReading[]): StudyTable {
  const people = named(readings, "person");
  const parts = named(readings, "part");
  const trials = named(readings, "trial");
  within(people.length, 1, 10, "person", "1 to 10 people");
  within(parts.length, 2, 20, "part", "2 to 20 parts");
  within(trials.length, 2, 10, "trial", "2 to 10 trials");
  const cells = new Map<string, number>();
  for (const [index, { person, part, trial, value }] of readings.entries()) {
    if (!Number.isFinite(value)) {
      throw new EngineeringError("not-a-number", `readings[${index}].value`, "This reading is no number.");
    }
    const key = keyOf(person, part, trial);
    if (cells.has(key)) {
      throw new EngineeringError(
        "repeated",
        `readings[${index}]`,
        `Trial ${trial} of person ${person} on part ${part} is there twice.`,
      );
    }
    cells.set(key, value);
  }
  const cell = (person: string, part: string, trial: string) => {
    const value = cells.get(keyOf(person, part, trial));
    if (value !== undefined) return value;
    throw new EngineeringError(
      "incomplete",
      "readings",
      `Trial ${trial} of person ${person} on part ${part} is missing: a study needs every person on every part.`,
    );
  };
  const values = people.map((person) =>
    parts.map((part) => trials.map((trial) => cell(person, part, trial))),
  );
  const flat = values.flat(2);
  if (flat.every((value) => value === flat[0])) {
    throw new EngineeringError(
      "no-variation",
      "readings",
      "All readings are equal: the gauge's step is too coarse.",
    );
  }
  return { people, parts, trials, values };
}

const keyOf = (...names: string[]): string => JSON.stringify(names);

function named(readings: readonly StudyReading[], what: "person" | "part" | "trial"): string[] {
  return [...new Set(readings.map((reading) => reading[what]))];
}

function within(count: number, least: number, most: number, field: string, words: string): void {
  if (count >= least && count <= most) return;
  throw new EngineeringError("outside-range", field, `A study takes ${words}, not ${count}.`);
}

/** The mean of the values of a table; there must be one. */
export function meanOfValues(values: readonly number[]): number {
  return values.reduce((sum, value) => sum + value, 0) / values.length;
}
