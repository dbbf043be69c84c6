import { EngineeringError } from "../engineering-error";
import { degrees, engineCycleAngle } from "./crank-angle";
import { cycleAngle, placeOnCycle } from "./round-the-cycle";

/** One point of a measured cylinder pressure. */
export interface TracePoint {
  /** Rad, 0 at top dead centre of firing, within one cycle. */
  crankAngle: number;
  /** Absolute, Pa. */
  pressure: number;
}

/** Units a trace may be written in, in Pa. */
const pressureUnits = { Pa: 1, kPa: 1e3, MPa: 1e6, bar: 1e5, psi: 6894.757293168 } as const;

/** What the text cannot say of itself. */
export interface TraceUnits {
  pressure: keyof typeof pressureUnits;
  /** Of the pressure that reads zero, absolute, Pa: 0 for absolute readings, that of the air for gauge readings. */
  zero: number;
}

const fewest = 90;
const most = 20_000;
const widestGap = 10 * degrees;
// Peak pressures of four-stroke engines, motored to detonating (common practice, no source).
const plausiblePeak = { from: 5e5, to: 4e7 };

/**
 * Reads a cylinder pressure trace of one four-stroke cycle from CSV text: crank angle in degrees in the first column,
 * pressure in the second, comma, semicolon or tab between them, a decimal comma where the separator is none.
 * Lines before the first number are headings. Angles may run 0–720 or −360–360, 0 at top dead centre of firing.
 * @throws EngineeringError with one sentence: `not-a-number`, `too-few-points`, `too-many-points`, `unsorted`, `gap`,
 *   `wrong-span`, `wrong-unit`, `wrong-dead-centre`
 */
export function readPressureTrace(text: string, units: TraceUnits): TracePoint[] {
  const rows = numbersOf(text);
  requireOrder(rows);
  const points = rows.map(([angle, pressure]) => ({
    crankAngle: cycleAngle(angle * degrees, engineCycleAngle),
    pressure: pressure * pressureUnits[units.pressure] + units.zero,
  }));
  requirePlausible(points, units.pressure);
  const closing = Math.abs(rows.at(-1)![0] - rows[0]![0] - 720) < 1e-6;
  return (closing ? points.slice(0, -1) : points).sort((a, b) => a.crankAngle - b.crankAngle);
}

/**
 * Pressure between the points of a trace, by straight lines, round the cycle.
 * @throws EngineeringError `too-few-points`, `not-a-number`, `unsorted` where the points are not those of a trace
 */
export function tracePressure(points: readonly TracePoint[]): (crankAngle: number) => number {
  requireCount(points.length);
  points.forEach((point, index) => {
    if (!Number.isFinite(point.crankAngle + point.pressure)) {
      refuse("not-a-number", `Point ${index + 1} of the trace is not a crank angle and a pressure.`);
    }
    if (index > 0 && point.crankAngle <= points[index - 1]!.crankAngle) {
      refuse(
        "unsorted",
        `The crank angles must rise; point ${index + 1} does not lie after the one before it.`,
      );
    }
  });
  const place = placeOnCycle(
    points.map((point) => point.crankAngle),
    engineCycleAngle,
  );
  return (crankAngle) => {
    const { before, after, part } = place(crankAngle);
    return (1 - part) * points[before]!.pressure + part * points[after]!.pressure;
  };
}

type Row = [angle: number, pressure: number];

function numbersOf(text: string): Row[] {
  const lines = text.split(/\r\n|\n|\r/);
  const rows: Row[] = [];
  lines.forEach((line, index) => {
    if (line.trim() === "") return;
    const row = rowOf(line);
    if (row) rows.push(row);
    else if (rows.length > 0) {
      refuse("not-a-number", `Line ${index + 1} of the trace is not a crank angle and a pressure.`);
    }
  });
  requireCount(rows.length);
  return rows;
}

function requireCount(count: number): void {
  if (count < fewest) {
    refuse("too-few-points", `A trace needs at least ${fewest} points over the cycle; this has ${count}.`);
  }
  if (count > most) {
    refuse("too-many-points", `A trace may have at most ${most} points; this has ${count}. Thin it out.`);
  }
}

function rowOf(line: string): Row | null {
  const separator = line.includes("\t") ? "\t" : line.includes(";") ? ";" : ",";
  const [angle, pressure] = line.split(separator).map((cell) => numberOf(cell, separator));
  return angle === undefined || pressure === undefined || Number.isNaN(angle + pressure)
    ? null
    : [angle, pressure];
}

function numberOf(cell: string, separator: string): number {
  const text = separator === "," ? cell.trim() : cell.trim().replace(",", ".");
  return /^[+-]?(\d+\.?\d*|\.\d+)(e[+-]?\d{1,2})?$/i.test(text) ? Number(text) : Number.NaN;
}

function requireOrder(rows: readonly Row[]): void {
  for (let index = 1; index < rows.length; index++) {
    const step = rows[index]![0] - rows[index - 1]![0];
    if (step <= 0) {
      refuse(
        "unsorted",
        `The crank angles must rise; ${rows[index]![0]}° comes after ${rows[index - 1]![0]}°.`,
      );
    }
    if (step * degrees > widestGap) {
      refuse("gap", `The trace has a gap of ${step.toFixed(1)}° after ${rows[index - 1]![0]}°.`);
    }
  }
  const span = rows.at(-1)![0] - rows[0]![0];
  if (span * degrees > engineCycleAngle + 1e-9 || span * degrees < engineCycleAngle - widestGap) {
    refuse("wrong-span", `A trace covers 720° of crank angle; this covers ${span.toFixed(1)}°.`);
  }
}

function requirePlausible(points: readonly TracePoint[], unit: string): void {
  const peak = points.reduce((high, point) => (point.pressure > high.pressure ? point : high));
  const lowest = points.reduce((low, point) => Math.min(low, point.pressure), Number.POSITIVE_INFINITY);
  if (peak.pressure < plausiblePeak.from || peak.pressure > plausiblePeak.to || lowest < -2e4) {
    refuse(
      "wrong-unit",
      `In ${unit} this trace runs from ${(lowest / 1e5).toPrecision(3)} to ${(peak.pressure / 1e5).toPrecision(3)} bar, which no engine does; check its unit and zero.`,
    );
  }
  const afterFiring = Math.cos(peak.crankAngle / 2);
  if (afterFiring < Math.SQRT1_2) {
    refuse(
      "wrong-dead-centre",
      `The highest pressure lies at ${(peak.crankAngle / degrees).toFixed(0)}°; zero must be top dead centre of firing.`,
    );
  }
}

function refuse(code: string, sentence: string): never {
  throw new EngineeringError(code, "trace", sentence);
}
