import { requireWithin } from "../cycle/sound-input";
import { EngineeringError } from "../engineering-error";
import { type Duty, requireClearance, requireDynamicViscosity, soundLoad } from "./duty";
import { filmCurves } from "./film-table";
import { heatedPoint, workingDensity } from "./heat-balance";
import { combinedRoughness, type Roughness } from "./roughness";

/** Even steps from one value to another, both among them. */
export interface Axis {
  from: number;
  to: number;
  count: number;
}

/** One duty of a bearing, over clearances (m, diametral) and viscosities in the film (Pa·s). */
export interface MapDuty extends Omit<Duty, "clearance"> {
  clearances: Axis;
  viscosities: Axis;
  roughness?: Roughness | undefined;
}

/** A row for each clearance, in it a value for each viscosity; all in SI. */
type Grid = number[][];

/** What a bearing does over clearance and viscosity; each number as in `SteadyFilm`. */
export interface FilmMap {
  clearances: number[];
  viscosities: number[];
  leastFilm: Grid;
  /** Null where no roughness was given. */
  lambda: Grid | null;
  frictionPower: Grid;
  sideFlow: Grid;
  /** Of an unfed bearing, K. */
  temperatureRise: Grid;
  /** Where the load asks for more than an eccentricity ratio of 0.99: the film is at most so thick. */
  outsideRange: boolean[][];
}

/**
 * The film map of a bearing at one duty, in one call.
 * Range: as `steadyFilm`; 2–200 steps an axis, rising.
 * @throws EngineeringError `not-a-number`, `not-positive`, `outside-range`, `missing`, `said-twice`
 */
export function filmMap(duty: MapDuty): FilmMap {
  const load = soundLoad(duty);
  const { diameter, length, speed, roughness } = duty;
  const clearances = stepsOf(duty.clearances, "clearances", (value, field) =>
    requireClearance(value, diameter, field),
  );
  const viscosities = stepsOf(duty.viscosities, "viscosities", requireDynamicViscosity);
  const combined = roughness && combinedRoughness(roughness);
  const curves = filmCurves(length / diameter);
  const points = clearances.map((clearance) =>
    viscosities.map((viscosity) =>
      heatedPoint(
        { diameter, length, clearance, speed, load, lands: 1 },
        viscosity,
        curves,
        {},
        workingDensity,
      ),
    ),
  );
  const gridOf = <Value>(of: (point: (typeof points)[number][number]) => Value) =>
    points.map((row) => row.map(of));
  return {
    clearances,
    viscosities,
    leastFilm: gridOf(({ leastFilm }) => leastFilm),
    lambda: combined === undefined ? null : gridOf(({ leastFilm }) => leastFilm / combined),
    frictionPower: gridOf(({ frictionPower }) => frictionPower),
    sideFlow: gridOf(({ sideFlow }) => sideFlow),
    temperatureRise: gridOf(({ temperatureRise }) => temperatureRise),
    outsideRange: gridOf(({ outsideRange }) => outsideRange),
  };
}

function stepsOf(
  { from, to, count }: Axis,
  field: string,
  requireSound: (value: number, field: string) => void,
): number[] {
  requireSound(from, `${field}.from`);
  requireSound(to, `${field}.to`);
  if (to <= from) {
    throw new EngineeringError(
      "order",
      `${field}.to`,
      `The ${field} must rise: ${to} does not follow ${from}.`,
    );
  }
  requireWithin(Math.round(count), `${field}.count`, { from: 2, to: 200, unit: "steps" });
  const steps = Math.round(count) - 1;
  return Array.from({ length: steps + 1 }, (_, index) => from + ((to - from) * index) / steps);
}
