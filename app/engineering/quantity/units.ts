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
  /** The core's units are `(value - zero) × factor ÷ divisor`: SI, but mm²/s for kinematic viscosity, °C. */
  factor: number;
  /** Where the factor is a quotient: dividing at the end keeps 212 °F exactly 100 °C. */
  divisor?: number;
  /** What this unit shows at 0 °C: temperatures only. */
  zero?: number;
  /** Exact, for lengths. */
  picometres?: bigint;
  /** Other ways people type it, without spaces. */
  aliases?: readonly string[];
  /** Where a capital makes another unit: MPa is a thousand million mPa, so neither is guessed from "mpa". */
  exactCase?: boolean;
}

const length = (picometres: bigint, aliases: readonly string[] = [], label?: string): Unit => ({
  dimension: "length",
  factor: Number(picometres),
  divisor: 1e12,
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
  thou: length(25_400_000n, ["mil", "mils", "thous", "thousandth", "thousandths"]),
  tenths: length(2_540_000n, ["tenth"]),
  uin: length(25_400n, ['u"', "uinch", "micro-inch", "microinch", "micro-inches", "microinches"], "µin"),
  m: length(1_000_000_000_000n, ["metre", "metres", "meter", "meters"]),
  mm: length(1_000_000_000n, ["millimetre", "millimetres", "millimeter", "millimeters"]),
  um: length(
    1_000_000n,
    ["micron", "microns", "micrometre", "micrometres", "micrometer", "micrometers"],
    "µm",
  ),
  nm: length(1_000n, ["nanometre", "nanometres", "nanometer", "nanometers"]),

  degC: { dimension: "temperature", factor: 1, label: "°C", aliases: ["c", "celsius"] },
  degF: {
    dimension: "temperature",
    factor: 5,
    divisor: 9,
    zero: 32,
    label: "°F",
    aliases: ["f", "fahrenheit"],
  },
  K: { dimension: "temperature", factor: 1, zero: 273.15, aliases: ["kelvin"] },

  Pa: { dimension: "pressure", factor: 1 },
  kPa: { dimension: "pressure", factor: 1e3 },
  MPa: { dimension: "pressure", factor: 1e6, exactCase: true },
  bar: { dimension: "pressure", factor: 1e5 },
  psi: { dimension: "pressure", factor: poundForce / inch ** 2 },

  "Pa s": { dimension: "dynamic-viscosity", factor: 1, label: "Pa·s" },
  "mPa s": {
    dimension: "dynamic-viscosity",
    factor: 1,
    divisor: 1e3,
    label: "mPa·s",
    aliases: ["mpas"],
    exactCase: true,
  },
  cP: { dimension: "dynamic-viscosity", factor: 1, divisor: 1e3 },

  "m2/s": { dimension: "kinematic-viscosity", factor: 1e6, label: "m²/s" },
  "mm2/s": { dimension: "kinematic-viscosity", factor: 1, label: "mm²/s" },
  cSt: { dimension: "kinematic-viscosity", factor: 1 },

  rpm: { dimension: "speed", factor: Math.PI, divisor: 30, aliases: ["rev/min", "r/min", "1/min"] },
  "rad/s": { dimension: "speed", factor: 1 },

  N: { dimension: "force", factor: 1 },
  kN: { dimension: "force", factor: 1e3 },
  lbf: { dimension: "force", factor: poundForce },

  kg: { dimension: "mass", factor: 1 },
  g: { dimension: "mass", factor: 1, divisor: 1e3 },

  s: { dimension: "time", factor: 1, aliases: ["sec"] },
  min: { dimension: "time", factor: 60 },
  h: { dimension: "time", factor: 3600, aliases: ["hr", "hour", "hours"] },

  "N m": { dimension: "torque", factor: 1, label: "N·m", aliases: ["nm"] },
  "lbf ft": {
    dimension: "torque",
    factor: poundForce * 0.3048,
    label: "lbf·ft",
    aliases: ["lbft", "ftlb", "ftlbf"],
  },

  "kg/m3": { dimension: "density", factor: 1, label: "kg/m³" },
  "g/cm3": { dimension: "density", factor: 1e3, label: "g/cm³", aliases: ["g/ml"] },
} as const satisfies Record<string, Unit>;

export type UnitName = keyof typeof units;

/** The units' names. */
export const unitNames = Object.keys(units) as UnitName[];

const unitOf = (name: UnitName): Unit => units[name];

const exact = new Map<string, UnitName[]>();
const folded = new Map<string, UnitName[]>();
for (const name of unitNames) {
  const { label, aliases = [], exactCase } = unitOf(name);
  for (const spelling of [name, ...(label ? [label] : []), ...aliases]) {
    enter(exact, squeeze(spelling), name);
    if (!exactCase) enter(folded, squeeze(spelling).toLowerCase(), name);
  }
}

function enter(spellings: Map<string, UnitName[]>, written: string, name: UnitName): void {
  const named = spellings.get(written) ?? [];
  if (!named.includes(name)) spellings.set(written, [...named, name]);
}

/** One spelling for what is the same to a reader: µ of either code point, raised figures, the dot of a product. */
function squeeze(text: string): string {
  return text
    .replace(/[\s·⋅^]/g, "")
    .replace(/[µμ]/g, "u")
    .replaceAll("²", "2")
    .replaceAll("³", "3")
    .replace(/\.$/, "");
}

/**
 * The unit of this spelling that a kind can take: `"wrong"` where it is a unit of something else, `undefined` where
 * nobody writes a unit so. Capitals count only where they make another unit.
 */
export function findUnit(written: string, kind: QuantityKind): UnitName | "wrong" | undefined {
  const text = squeeze(written);
  const named = exact.get(text) ?? folded.get(text.toLowerCase());
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

const usual: Partial<Record<QuantityKind, readonly UnitName[]>> = {
  "small-length": ["thou", "in", "tenths", "um"],
  length: ["in", "mm"],
  finish: ["uin", "um"],
};

/** The units to offer for a kind, the trade's own first; every unit of `unitsOf` is still read. */
export function usualUnits(kind: QuantityKind): readonly UnitName[] {
  return usual[kind] ?? unitsOf(kind);
}

/** A unit as it is written on a page: µm, °C, mm²/s. */
export function unitLabel(name: UnitName): string {
  return unitOf(name).label ?? name;
}

/** A value in a unit as the core takes it: SI, but °C, and mm²/s for kinematic viscosity. */
export function toCore(value: number, name: UnitName): number {
  const { factor, divisor = 1, zero = 0 } = unitOf(name);
  return ((value - zero) * factor) / divisor;
}

/** A value of the core in a unit: `fromCore(kv40, "m2/s")` gives the SI value of a kinematic viscosity. */
export function fromCore(value: number, name: UnitName): number {
  const { factor, divisor = 1, zero = 0 } = unitOf(name);
  return (value * divisor) / factor + zero;
}

/** Picometres in one unit of length, exact. @throws EngineeringError `wrong-unit` for a unit of something else */
export function picometresIn(name: UnitName): bigint {
  const { picometres } = unitOf(name);
  if (picometres === undefined)
    throw new EngineeringError("wrong-unit", "unit", `${unitLabel(name)} is no unit of length.`);
  return picometres;
}
