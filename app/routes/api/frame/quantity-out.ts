import { z } from "zod";
import {
  clearanceUnitName,
  diameterUnitName,
  type PageUnits,
  pressureUnit,
} from "~/engineering/quantity/figures";
import { formatWithUnit } from "~/engineering/quantity/format";
import { fromCore, type UnitName } from "~/engineering/quantity/units";

export type Units = PageUnits;

/** The units that the texts of an answer are in. */
export const unitsQuery = z
  .enum(["inch", "metric"])
  .default("inch")
  .meta({ description: "The units of the texts; the numbers are SI whichever is chosen." });

/** A quantity as every answer gives it. */
export const quantityOut = z
  .object({
    si: z.number().meta({ description: "In the SI base unit; temperatures in °C." }),
    text: z
      .string()
      .meta({ description: "In the units asked for, as a person reads it.", examples: ["0.0025 in"] }),
  })
  .meta({ id: "Quantity" });

export type QuantityOut = z.infer<typeof quantityOut>;

/**
 * Quantities as answers give them, each from the core's unit (SI; °C; mm²/s for kinematic viscosity).
 * @throws EngineeringError for a value that is no number
 */
export type Say = ReturnType<typeof sayIn>;

/** Says quantities in the caller's units. */
export function sayIn(units: Units) {
  const inch = units === "inch";
  const clearanceUnit = clearanceUnitName(units);
  return {
    /** A diameter or another size of a part, m. */
    length: (m: number) => say(m, diameterUnitName(units), inch ? [4, 6] : [3, 5]),
    /** A clearance or a step of one, m. */
    clearance: (m: number) => say(m, clearanceUnit, inch ? [4, 6] : [1, 3]),
    /** A film, a finish, a wear or a gauge's figure, m. */
    fine: (m: number) => say(m, inch ? "uin" : "um", inch ? [1, 2] : [2, 4]),
    temperature: (celsius: number) => say(celsius, "degC", [1, 1]),
    /** Oil pressure, Pa. */
    pressure: (pascals: number) => say(pascals, pressureUnit(units), inch ? [0, 1] : [2, 3]),
    /** A load on a projected area, or the peak of a film, Pa. */
    stress: (pascals: number) => say(pascals, inch ? "psi" : "MPa", inch ? [0, 1] : [2, 4]),
    speed: (radians: number) => say(radians, "rpm", [0, 1]),
    force: (newtons: number) => say(newtons, inch ? "lbf" : "N", [0, 2]),
    density: (value: number) => say(value, "kg/m3", [1, 2]),
    /** Dynamic viscosity, Pa·s. */
    viscosity: (pascalSeconds: number) => say(pascalSeconds, "mPa s", [2, 4]),
    /** Kinematic viscosity, from mm²/s; its `si` is in m²/s. */
    kinematic: (value: number) => ({ ...say(value, "cSt", [2, 4]), si: value / 1e6 }),
    power: (watts: number) => ({ si: watts, text: `${significant(watts)} W` }),
    /** A flow of oil, m³/s. */
    flow: (value: number) => ({ si: value, text: `${significant(value * 1e6)} cm³/s` }),
    /** A difference of temperatures, K. */
    rise: (kelvins: number) => ({ si: kelvins, text: `${significant(kelvins)} °C` }),
    /** Wear per time, from m/h; its `si` is in m/s. */
    wearRate: (perHour: number) => {
      const { text } = say(perHour, inch ? "uin" : "um", inch ? [2, 3] : [3, 5]);
      return { si: perHour / 3600, text: `${text}/h` };
    },
  };
}

/** With as many decimals as it needs, between two counts; what is smaller than the last is said by significant digits. */
function say(value: number, unit: UnitName, [least, most]: [number, number]): QuantityOut {
  const there = Math.abs(fromCore(value, unit));
  const decimals =
    there > 0 && there < 10 ** -(most - 1) ? Math.min(18, -Math.floor(Math.log10(there)) + 1) : most;
  const [, number = "", label = ""] = /^(\S+)( .*)$/.exec(formatWithUnit(value, unit, decimals)) ?? [];
  return { si: value, text: trimmed(number, least) + label };
}

function trimmed(number: string, least: number): string {
  const [whole = "", behind = ""] = number.split(".");
  const kept = behind.slice(0, least) + behind.slice(least).replace(/0+$/, "");
  return kept ? `${whole}.${kept}` : whole;
}

function significant(value: number): string {
  return String(Number(value.toPrecision(4)));
}
