import { requireWithin } from "../cycle/sound-input";
import { EngineeringError } from "../engineering-error";
import { shearedLine } from "../oil/high-shear";
import type { OilData } from "../oil/oil-data";
import { trustedRange } from "../oil/viscosity";
import { radial } from "../radial";
import { requireClearance, requireDynamicViscosity, type SteadyDuty, soundLoad } from "./duty";
import { partedBearing } from "./feed";
import { assumptionsOf } from "./film-assumptions";
import { filmCurves } from "./film-table";
import { balancedPoint, type HeatedPoint, heatedPoint, hottest, workingDensity } from "./heat-balance";
import { filmParameter, type Regime, regimeOf } from "./roughness";
import type { RunningBearing } from "./working-point";

/** A steady film, its friction and its oil, in SI; what each number is: `WorkingPoint` and `HeatedPoint`. */
export interface SteadyFilm extends Omit<HeatedPoint, "viscosity"> {
  effectiveViscosity: number;
  /** Of the oil in the film, °C; null where a viscosity was given without a supply temperature. */
  effectiveTemperatureC: number | null;
  /** Least film over roughness, and what it means; null where no roughness was given. */
  lambda: number | null;
  regime: Regime | null;
  /** False where no temperature up to 200 °C balances the heat. */
  converged: boolean;
  /** What the numbers rest on and what they cannot see, a sentence each. */
  assumptions: string[];
}

/**
 * Least film, friction, flow and warmth of a plain bearing at a steady working point, from the Reynolds equation
 * (`filmCurves`) and a heat balance (`balancedPoint`).
 * Range: L/D 0.15–1.5 of each land. Beyond an eccentricity ratio of 0.99, a laminar film or oil between 0 and 150 °C
 * the answer is flagged `outsideRange`, and beyond 0.99 `leastFilm` is an upper bound.
 * Expected error: 1 % of the film of a rigid, aligned bearing at that viscosity; the heat balance 20 % of the rise.
 * @throws EngineeringError `not-a-number`, `not-positive`, `outside-range`, `missing`, `said-twice`, and of the oil's data
 */
export function steadyFilm(duty: SteadyDuty): SteadyFilm {
  const bearing = soundBearing(duty);
  const curves = filmCurves(bearing.length / bearing.diameter);
  const pointAt = (viscosity: number, density: number) =>
    heatedPoint(bearing, viscosity, curves, duty, density);
  const { viscosity, ...point } = duty.oil ? withOil(duty, duty.oil, pointAt) : withViscosity(duty, pointAt);
  const lambda = duty.roughness ? filmParameter(point.leastFilm, duty.roughness) : null;
  const reasons = beyondRange(bearing, viscosity, point);
  return {
    ...point,
    effectiveViscosity: viscosity,
    lambda,
    regime: lambda === null ? null : regimeOf(lambda),
    outsideRange: reasons.length > 0,
    assumptions: [...reasons, ...assumptionsOf(duty)],
  };
}

function soundBearing(duty: SteadyDuty): RunningBearing {
  const load = soundLoad(duty);
  const { diameter, length, clearance, speed, feed, supplyPressure } = duty;
  requireClearance(clearance, diameter, "clearance");
  if (supplyPressure !== undefined) {
    requireWithin(supplyPressure, "supplyPressure", { from: 0, to: 1e8, unit: "Pa" });
  }
  if ((supplyPressure ?? 0) > 0 !== (feed !== undefined)) {
    throw new EngineeringError(
      "missing",
      feed ? "supplyPressure" : "feed",
      "A pressure-fed bearing needs both: its supply pressure, and the hole or groove the oil comes in by.",
    );
  }
  return partedBearing({ diameter, length, clearance, speed, load, lands: 1 }, feed);
}

type PointAt = (viscosity: number, density: number) => HeatedPoint;

function withOil({ viscosity, supplyTemperatureC }: SteadyDuty, oil: OilData, pointAt: PointAt) {
  if (viscosity !== undefined) {
    throw new EngineeringError("said-twice", "viscosity", "Give a viscosity or an oil, not both.");
  }
  if (supplyTemperatureC === undefined) {
    throw new EngineeringError(
      "missing",
      "supplyTemperatureC",
      "An oil's viscosity needs the temperature at which the oil comes to the bearing.",
    );
  }
  requireSupplyTemperature(supplyTemperatureC);
  return balancedPoint(shearedLine(oil), oil.density15, supplyTemperatureC, pointAt);
}

function withViscosity({ viscosity, supplyTemperatureC }: SteadyDuty, pointAt: PointAt) {
  if (viscosity === undefined) {
    throw new EngineeringError("missing", "viscosity", "Give the oil's viscosity in the film, or the oil.");
  }
  requireDynamicViscosity(viscosity, "viscosity");
  if (supplyTemperatureC !== undefined) requireSupplyTemperature(supplyTemperatureC);
  const point = pointAt(viscosity, workingDensity);
  return {
    ...point,
    effectiveTemperatureC:
      supplyTemperatureC === undefined ? null : supplyTemperatureC + point.temperatureRise / 2,
    converged: true,
  };
}

function requireSupplyTemperature(temperatureC: number): void {
  requireWithin(temperatureC, "supplyTemperatureC", { from: -30, to: 180, unit: "°C" });
}

/** Why the answer is outside what the model holds for; none where it is inside. */
function beyondRange(
  { diameter, clearance, speed }: RunningBearing,
  viscosity: number,
  point: Omit<HeatedPoint, "viscosity"> & { effectiveTemperatureC: number | null; converged: boolean },
): string[] {
  const reasons: string[] = [];
  if (point.outsideRange) {
    reasons.push(
      "The load asks for more than 99 % of the clearance as eccentricity: the real film is thinner than the one given, friction and peak pressure higher.",
    );
  }
  const gap = radial(clearance);
  const reynoldsNumber = (workingDensity * speed * (diameter / 2) * gap) / viscosity;
  // Taylor's limit, 41.3 √(R/C) (G. I. Taylor 1923, as handbooks quote it; from memory).
  if (reynoldsNumber > 41.3 * Math.sqrt(diameter / 2 / gap)) {
    reasons.push("The film is no longer laminar at this speed and clearance: friction is higher than given.");
  }
  if (!point.converged) {
    reasons.push(
      `No oil temperature up to ${hottest} °C balances the heat: the film at ${hottest} °C is given.`,
    );
  }
  if (point.temperatureRise > hottest) {
    reasons.push(
      "The oil that flows cannot carry the heat away: real oil would burn, or thin and heat less.",
    );
  }
  const temperatureC = point.effectiveTemperatureC;
  if (temperatureC !== null && (temperatureC < trustedRange.from || temperatureC > trustedRange.to)) {
    reasons.push(
      `The oil would be at ${temperatureC.toFixed(0)} °C, beyond the ${trustedRange.from} to ${trustedRange.to} °C that its viscosity line is trusted for.`,
    );
  }
  return reasons;
}
