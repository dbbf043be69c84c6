import { EngineeringError } from "../engineering-error";

/** What a quantity is of; a unit belongs to one dimension, a kind says which units a field may take. */
export type QuantityKind =
  | "small-length"
  | "length"
  | "finish"
  | "temperature"
  | "pressure"
  | "dynamic-viscosity"
  | "kinematic-viscosity"
  | "speed"
  | "force"
  | "mass"
  | "time"
  | "torque"
  | "density";

type Dimension =
  | "length"
  | "temperature"
  | "pressure"
  | "dynamic-viscosity"
  | "kinematic-viscosity"
  | "speed"
  | "force"
  | "mass"
  | "time"
  | "torque"
  | "density";

const dimensionOf: Record<QuantityKind, Dimension> = {
  "small-length": "length",
  length: "length",
  finish: "length",
  temperature: "temperature",
  pressure: "pressure",
  "dynamic-viscosity": "dynamic-viscosity",
  "kinematic-viscosity": "kinematic-viscosity",
  speed: "speed",
  force: "force",
  mass: "mass",
  time: "time",
  torque: "torque",
  density: "density",
};

interface Unit {
  dimension: Dimension;
  /** How it is written on a page; the name itself where not given. */
  label?: string;
  /** How many of the core's units one of these is: SI, but mm²/s for kinematic viscosity, °C for temperature. */
  factor: number;
  /** Added after the factor: temperatures only. */
  offset?: number;
  /** Exact, for lengths. */
  picometres?: bigint;
  /** Other ways people type it, in lower case without spaces. */
  aliases?: readonly string[];
}

const length = (picometres: bigint, aliases: readonly string[] = [], label?: string): Unit => ({
  dimension: "length",
  factor: Number(picometres) / 1e12,
  picometres,
  aliases,
  ...(label ? { label } : {}),
});

const pound = 0.45359237;
const poundForce = pound * 9.80665;
const inch = 0.0254;

/**
 * Every unit by its name in the API. Inch, pound and standard gravity are exact by definition
 * (NIST SP 811, appendix B); a thou is a thousandth, a tenth a ten-thousandth of an inch (the trade's terms).
 */
export const units = {
  in: length(25_400_000_000n, ['"', "″", "”", "''", "inch", "inches"]),
  thou: length(25_400_000n, ["mil", "mils", "thous"]),
  tenths: length(2_540_000n, ["tenth"]),
  uin: length(25_400n, ['u"', "uinch", "micro-inch", "microinch", "micro-inches", "microinches"], "µin"),
  m: length(1_000_000_000_000n, ["metre", "metres", "meter", "meters"]),
  mm: length(1_000_000_000n, ["millimetre", "millimetres", "millimeter", "millimeters"]),
  um: length(1_000_000n, ["micron", "microns", "micrometre", "micrometres"], "µm"),
  nm: length(1_000n, ["nanometre", "nanometres"]),

  degC: { dimension: "temperature", factor: 1, offset: 0, label: "°C", aliases: ["c", "°c", "celsius"] },
  degF: {
    dimension: "temperature",
    factor: 1 / 1.8,
    offset: -32 / 1.8,
    label: "°F",
    aliases: ["f", "°f", "fahrenheit"],
  },
  K: { dimension: "temperature", factor: 1, offset: -273.15, aliases: ["kelvin"] },

  Pa: { dimension: "pressure", factor: 1 },
  kPa: { dimension: "pressure", factor: 1e3 },
  MPa: { dimension: "pressure", factor: 1e6 },
  bar: { dimension: "pressure", factor: 1e5 },
  psi: { dimension: "pressure", factor: poundForce / inch ** 2 },

  "Pa s": { dimension: "dynamic-viscosity", factor: 1, label: "Pa·s", aliases: ["pa·s", "pas"] },
  "mPa s": { dimension: "dynamic-viscosity", factor: 1e-3, label: "mPa·s", aliases: ["mpa·s", "mpas"] },
  cP: { dimension: "dynamic-viscosity", factor: 1e-3 },

  "m2/s": { dimension: "kinematic-viscosity", factor: 1e6, label: "m²/s", aliases: ["m²/s", "m^2/s"] },
  "mm2/s": { dimension: "kinematic-viscosity", factor: 1, label: "mm²/s", aliases: ["mm²/s", "mm^2/s"] },
  cSt: { dimension: "kinematic-viscosity", factor: 1 },

  rpm: { dimension: "speed", factor: Math.PI / 30, aliases: ["rev/min", "1/min"] },
  "rad/s": { dimension: "speed", factor: 1 },

  N: { dimension: "force", factor: 1 },
  kN: { dimension: "force", factor: 1e3 },
  lbf: { dimension: "force", factor: poundForce },

  kg: { dimension: "mass", factor: 1 },
  g: { dimension: "mass", factor: 1e-3 },

  s: { dimension: "time", factor: 1, aliases: ["sec"] },
  min: { dimension: "time", factor: 60 },
  h: { dimension: "time", factor: 3600, aliases: ["hr", "hour", "hours"] },

  "N m": { dimension: "torque", factor: 1, label: "N·m", aliases: ["n·m", "nm"] },
  "lbf ft": {
    dimension: "torque",
    factor: poundForce * 0.3048,
    label: "lbf·ft",
    aliases: ["lbf·ft", "lb ft", "ft lb", "ftlb"],
  },

  "kg/m3": { dimension: "density", factor: 1, label: "kg/m³", aliases: ["kg/m³", "kg/m^3"] },
  "g/cm3": { dimension: "density", factor: 1e3, label: "g/cm³", aliases: ["g/cm³", "g/cm^3", "g/ml"] },
} as const satisfies Record<string, Unit>;

export type UnitName = keyof typeof units;

/** The units' names. */
export const unitNames = Object.keys(units) as UnitName[];

const unitOf = (name: UnitName): Unit => units[name];

// Case matters only where it must (MPa is not mPa), so every spelling is kept as it is and in lower case.
const spellings = new Map<string, UnitName[]>();
for (const name of unitNames) {
  for (const spelling of [name, unitOf(name).label, ...(unitOf(name).aliases ?? [])]) {
    if (spelling === undefined) continue;
    for (const written of new Set([squeeze(spelling), squeeze(spelling).toLowerCase()])) {
      const named = spellings.get(written) ?? [];
      if (!named.includes(name)) spellings.set(written, [...named, name]);
    }
  }
}

function squeeze(text: string): string {
  return text.replace(/[\s\u00A0\u202F]/g, "").replace(/[µμ]/g, "u");
}

/** The unit of this spelling that a kind can take; `undefined` where nobody writes a unit so. */
export function findUnit(written: string, kind: QuantityKind): UnitName | "wrong" | undefined {
  const text = squeeze(written);
  const named = spellings.get(text) ?? spellings.get(text.toLowerCase());
  if (!named) return undefined;
  return named.find((name) => isUnitOf(name, kind)) ?? "wrong";
}

/** Whether a kind of quantity is measured in this unit. */
export function isUnitOf(name: UnitName, kind: QuantityKind): boolean {
  return unitOf(name).dimension === dimensionOf[kind];
}

/** The units that a kind can take. */
export function unitsOf(kind: QuantityKind): UnitName[] {
  return unitNames.filter((name) => isUnitOf(name, kind));
}

/** A unit as it is written on a page: µm, °C, mm²/s. */
export function unitLabel(name: UnitName): string {
  return unitOf(name).label ?? name;
}

/** A value in a unit as the core takes it. */
export function toCore(value: number, name: UnitName): number {
  const { factor, offset = 0 } = unitOf(name);
  return value * factor + offset;
}

/** A value of the core in a unit. */
export function fromCore(value: number, name: UnitName): number {
  const { factor, offset = 0 } = unitOf(name);
  return (value - offset) / factor;
}

/** Picometres in one unit of length, exact. @throws EngineeringError `wrong-unit` for a unit of something else */
export function picometresIn(name: UnitName): bigint {
  const { picometres } = unitOf(name);
  if (picometres === undefined)
    throw new EngineeringError("wrong-unit", "unit", `${unitLabel(name)} is no unit of length.`);
  return picometres;
}
