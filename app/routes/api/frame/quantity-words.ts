import { formatWithUnit } from "~/engineering/quantity/format";
import { type QuantityKind, type UnitName, unitsOf } from "~/engineering/quantity/units";

/** Where a quantity may lie, in the core's units (SI; °C; mm²/s). */
export interface Limits {
  /** It must be greater than this. */
  over?: number;
  least?: number;
  most?: number;
}

/** A range as a person reads it. */
export function rangeText(kind: QuantityKind, { over, least, most }: Limits): string {
  const text = (limit: number) => {
    const [, number, label] = /^(\S+) (.*)$/.exec(formatWithUnit(limit, commonUnits[kind], 6)) ?? [];
    return `${Number(number)} ${label}`;
  };
  const bounds = [
    over === undefined ? "" : `over ${text(over)}`,
    least === undefined ? "" : `at least ${text(least)}`,
    most === undefined ? "" : `at most ${text(most)}`,
  ];
  return bounds.filter(Boolean).join(" and ");
}

/** What the description of the API says of a quantity. */
export function described(kind: QuantityKind, limits: Limits) {
  const range = rangeText(kind, limits);
  return {
    description: `With its unit: ${unitsOf(kind).join(", ")}${range && `; ${range}`}.`,
    examples: [exampleOf(kind)],
  };
}

const commonUnits: Record<QuantityKind, UnitName> = {
  "small-length": "mm",
  length: "mm",
  finish: "um",
  temperature: "degC",
  pressure: "bar",
  "dynamic-viscosity": "mPa s",
  "kinematic-viscosity": "cSt",
  speed: "rpm",
  force: "N",
  mass: "kg",
  time: "h",
  torque: "N m",
  density: "kg/m3",
};

/** A quantity as one would type it. */
export const exampleOf = (kind: QuantityKind): string => examples[kind];

const examples: Record<QuantityKind, string> = {
  "small-length": "25 tenths",
  length: "2.1000 in",
  finish: "8 uin",
  temperature: "95 degC",
  pressure: "60 psi",
  "dynamic-viscosity": "12 mPa s",
  "kinematic-viscosity": "16.2 cSt",
  speed: "7200 rpm",
  force: "12 kN",
  mass: "520 g",
  time: "6.5 h",
  torque: "60 lbf ft",
  density: "870 kg/m3",
};
