import { EngineeringError } from "../engineering-error";
import { oddOneOut } from "./odd-one-out";
import { type Diameters, type PositionWear, positionWear } from "./position-wear";
import { type Trend, weightedTrend } from "./trend";
import { type WearRate, wearRate } from "./wear-rate";

export interface BuildMeasured {
  hours: number;
  positions: { position: number; assembled: Diameters; tornDown: Diameters }[];
  /** Expanded (about 95 %) uncertainty of one diameter, m. */
  uncertainty: number;
}

export interface WearOfBuild {
  hours: number;
  positions: ({ position: number } & PositionWear & WearRate)[];
  /** The position whose wear stands out from the others of its build, if one does. */
  oddOneOut: { position: number; robustZ: number } | null;
}

export interface WearOfBuilds {
  builds: WearOfBuild[];
  /**
   * Wear of every position, slips left out, against the hours of its build: the slope is the steady rate (m/h), the
   * intercept what every run wears at once (bedding-in). Null where fewer than two different hours were run.
   */
  trend: Trend | null;
}

/**
 * The wear of builds with their trend over hours.
 * @throws EngineeringError where a diameter, an uncertainty or the hours cannot be
 */
export function wearOfBuilds(builds: readonly BuildMeasured[]): WearOfBuilds {
  const worn = builds.map((build, index) => inBuild(index, () => wearOfBuild(build)));
  const points = worn.flatMap(({ hours, positions }) =>
    positions
      .filter(({ clearance }) => clearance.verdict !== "slip")
      .map(({ clearance }) => ({ x: hours, y: clearance.wear, uncertainty: clearance.uncertainty / 2 })),
  );
  const severalHours = new Set(points.map(({ x }) => x)).size > 1;
  return { builds: worn, trend: severalHours ? weightedTrend(points) : null };
}

function wearOfBuild({ hours, positions, uncertainty }: BuildMeasured): WearOfBuild {
  const worn = positions.map(({ position, assembled, tornDown }) => {
    const wear = positionWear(assembled, tornDown, uncertainty);
    return { position, ...wear, ...wearRate(wear.clearance, hours) };
  });
  const odd = oddOneOut(
    worn.map(({ clearance }) => clearance.wear),
    // The standard uncertainty of the growth of a clearance: half of its expanded one, 2 × that of a diameter.
    uncertainty,
  );
  return {
    hours,
    positions: worn,
    oddOneOut: odd && { position: worn[odd.index]!.position, robustZ: odd.robustZ },
  };
}

/** Names the build in an error from within. */
function inBuild<T>(index: number, work: () => T): T {
  try {
    return work();
  } catch (error) {
    if (!(error instanceof EngineeringError)) throw error;
    throw new EngineeringError(error.code, `builds[${index}].${error.field}`, error.message);
  }
}
