import { EngineeringError } from "../engineering-error";
import { densityAt, usualDensity15 } from "./density";
import { type OilData, requireOil, requireOilTemperature, requireViscosity } from "./oil-data";
import { doubleLog, fromDoubleLog } from "./walther";

/** One measured kinematic viscosity, mm²/s. */
export interface ViscosityPoint {
  temperatureC: number;
  kinematic: number;
}

/** An oil at one temperature. */
export interface OilState {
  temperatureC: number;
  /** mm²/s. */
  kinematic: number;
  /** Pa·s, without shear thinning. */
  dynamic: number;
  /** kg/m³. */
  density: number;
  /** True beyond 0–150 °C, where the line through two points is an extrapolation too far to lean on. */
  outsideRange: boolean;
}

/** Where the line through two measured points is usual to read, °C. */
export const trustedRange = { from: 0, to: 150 } as const;

/**
 * Kinematic viscosity, mm²/s, as a function of temperature, °C, from any two measured points.
 * Range: points 0.21–10⁵ mm²/s; answers from −40 to 250 °C, beyond is refused. Expected error: 1–2 % between the
 * points (recalled); below 0 °C a multigrade is thicker than the line says.
 * Source: ASTM D341, log log Z = A − B log T, T in K.
 * @throws EngineeringError `not-a-number`, `not-positive`, `outside-range`, `viscosity-order`
 */
export function viscosityLine(
  first: ViscosityPoint,
  second: ViscosityPoint,
): (temperatureC: number) => number {
  for (const [index, { temperatureC, kinematic }] of [first, second].entries()) {
    requireOilTemperature(temperatureC, `points[${index}].temperature`);
    requireViscosity(kinematic, `points[${index}].kinematic`);
  }
  const [cold, hot] = first.temperatureC < second.temperatureC ? [first, second] : [second, first];
  if (hot.temperatureC - cold.temperatureC < 1) {
    throw new EngineeringError(
      "viscosity-order",
      "points",
      "The two viscosities must be at two different temperatures.",
    );
  }
  if (hot.kinematic >= cold.kinematic) {
    throw new EngineeringError(
      "viscosity-order",
      "points",
      `An oil is thinner when hot, but here it is ${hot.kinematic} mm²/s at ${hot.temperatureC} °C and ${cold.kinematic} at ${cold.temperatureC} °C. Are the two exchanged?`,
    );
  }
  const slope =
    (doubleLog(hot.kinematic) - doubleLog(cold.kinematic)) /
    (logKelvin(hot.temperatureC) - logKelvin(cold.temperatureC));
  const level = doubleLog(cold.kinematic) - slope * logKelvin(cold.temperatureC);
  return (temperatureC) => {
    requireOilTemperature(temperatureC, "temperature");
    const kinematic = fromDoubleLog(level + slope * logKelvin(temperatureC));
    if (kinematic >= 0.21 && kinematic <= 2e7) return kinematic;
    throw new EngineeringError(
      "outside-range",
      "temperature",
      `At ${temperatureC} °C this oil would be ${kinematic.toPrecision(2)} mm²/s, where ASTM D341 no longer holds.`,
    );
  };
}

/**
 * Kinematic viscosity of an oil at a temperature, mm²/s, by `viscosityLine` through its 40 and 100 °C.
 * @throws EngineeringError as `viscosityLine`; `viscosity-order` where KV100 is not below KV40
 */
export function kinematicViscosity(oil: OilData, temperatureC: number): number {
  return lineOf(oil)(temperatureC);
}

/** Dynamic viscosity of an oil at a temperature without shear thinning, Pa·s: kinematic viscosity times density. */
export function dynamicViscosity(oil: OilData, temperatureC: number): number {
  return dynamicLine(oil)(temperatureC);
}

/** `dynamicViscosity` for one oil at many temperatures. */
export function dynamicLine(oil: OilData): (temperatureC: number) => number {
  const kinematicAt = lineOf(oil);
  const density15 = oil.density15 ?? usualDensity15;
  return (temperatureC) => kinematicAt(temperatureC) * 1e-6 * densityAt(density15, temperatureC);
}

/** An oil at a temperature: both viscosities, density, and whether the temperature is far from the measured ones. */
export function oilAt(oil: OilData, temperatureC: number): OilState {
  return {
    temperatureC,
    kinematic: kinematicViscosity(oil, temperatureC),
    dynamic: dynamicViscosity(oil, temperatureC),
    density: densityAt(oil.density15 ?? usualDensity15, temperatureC),
    outsideRange: temperatureC < trustedRange.from || temperatureC > trustedRange.to,
  };
}

/**
 * The 40 and 100 °C viscosities of an oil that was measured at two other temperatures, mm²/s.
 * @throws EngineeringError as `viscosityLine`
 */
export function oilFromPoints(
  first: ViscosityPoint,
  second: ViscosityPoint,
  rest: Pick<OilData, "density15" | "hths"> = {},
): OilData {
  const at = viscosityLine(first, second);
  return { kv40: at(40), kv100: at(100), ...rest };
}

function lineOf(oil: OilData): (temperatureC: number) => number {
  requireOil(oil);
  return viscosityLine(
    { temperatureC: 40, kinematic: oil.kv40 },
    { temperatureC: 100, kinematic: oil.kv100 },
  );
}

const logKelvin = (temperatureC: number) => Math.log10(temperatureC + 273.15);
