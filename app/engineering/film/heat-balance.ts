import { densityAt, usualDensity15 } from "../oil/density";
import { risingRoot } from "./false-position";
import { type Feed, pressureFlow } from "./feed";
import type { FilmCurves } from "./film-table";
import { type RunningBearing, type WorkingPoint, workingPoint } from "./working-point";

/** Specific heat of oil, J/(kg K): 0.42 Btu/(lb °F) of Shigley's Mechanical Engineering Design. Hot oil holds up to a fifth more. */
export const specificHeat = 1760;

/** Density of oil in a bearing whose temperature is not known, kg/m³: 0.0311 lb/in³, of the same source. */
export const workingDensity = 861;

/** Oil no hotter than this is looked for, °C. */
export const hottest = 200;

/** How a bearing gets its oil. */
export interface Supply {
  feed?: Feed | undefined;
  /** Above the surroundings, Pa. */
  supplyPressure?: number | undefined;
}

/** A film with what its oil carries away. */
export interface HeatedPoint extends WorkingPoint {
  viscosity: number;
  /** Driven through by the supply pressure, m³/s. */
  pressureFlow: number;
  /** From supply to the hottest oil that leaves, K. */
  temperatureRise: number;
}

/**
 * A film at one viscosity and the rise of its oil. All of the friction goes into the oil, which leaves
 * - without a feed: as inflow less half the side flow, the sides leaving half-way warm (A. Raimondi & J. Boyd,
 *   ASLE Trans. 1 (1958), as in Shigley's Mechanical Engineering Design, eq. 12-15; from memory);
 * - with a hole: as side flow and pressure flow together (ISO 7902-1; from memory);
 * - with a groove: as pressure flow alone (Shigley, pressure-fed bearings), which errs to the hot side.
 */
export function heatedPoint(
  bearing: RunningBearing,
  viscosity: number,
  curves: FilmCurves,
  { feed, supplyPressure }: Supply,
  density: number,
): HeatedPoint {
  const point = workingPoint(bearing, viscosity, curves);
  const pressed =
    feed && supplyPressure
      ? pressureFlow(feed, supplyPressure, bearing, viscosity, point.eccentricityRatio)
      : 0;
  const carrying = {
    none: point.inflow - point.sideFlow / 2,
    hole: point.sideFlow + pressed,
    groove: pressed,
  }[feed?.kind ?? "none"];
  return {
    ...point,
    viscosity,
    pressureFlow: pressed,
    temperatureRise: point.frictionPower / (density * specificHeat * carrying),
  };
}

/** A film whose oil and viscosity are at one temperature, °C. */
export interface BalancedPoint extends HeatedPoint {
  effectiveTemperatureC: number;
  converged: boolean;
}

/**
 * The film whose viscosity is that of oil half-way between supply and its rise: T = Tₛ + ΔT/2 (source as above).
 * Hotter oil is thinner and heats less, so there is one answer; none is found beyond 200 °C, then the film there is
 * given and `converged` is false.
 */
export function balancedPoint(
  viscosityAt: (temperatureC: number) => number,
  density15: number | undefined,
  supplyTemperatureC: number,
  pointAt: (viscosity: number, density: number) => HeatedPoint,
): BalancedPoint {
  const at = (temperatureC: number) =>
    pointAt(viscosityAt(temperatureC), densityAt(density15 ?? usualDensity15, temperatureC));
  const excess = (temperatureC: number) =>
    temperatureC - supplyTemperatureC - at(temperatureC).temperatureRise / 2;
  const { place, converged } = risingRoot(excess, {
    low: supplyTemperatureC,
    high: Math.min(hottest, supplyTemperatureC + at(supplyTemperatureC).temperatureRise / 2),
    tolerance: 1e-7,
  });
  return { ...at(place), effectiveTemperatureC: place, converged };
}
