import { EngineeringError } from "../engineering-error";
import { type BudgetLine, combine, rectangular, type Uncertainty } from "./budget";
import { pooled, repeatabilityOf } from "./repeatability";

/** What is known of a gauge: the step it shows, and the standard uncertainties of its calibration and repeats, m. */
export interface GaugeSpecification {
  resolution: number;
  calibration: number;
  repeatability: number;
  /** Degrees of freedom of the repeatability: readings of its study less parts; 10 where nobody said. */
  repeatabilityDegreesOfFreedom?: number | undefined;
}

export interface ClearanceUncertaintyInput {
  boreGauge: GaugeSpecification;
  journalGauge: GaugeSpecification;
  /** Absolute: two gauges, both calibrations count. Comparative: the bore gauge was zeroed on the micrometer's setting. */
  method: "absolute" | "comparative";
  /** Diameter, m. */
  nominal: number;
  /** Linear expansion and its standard uncertainty, per °C. */
  bore?: { expansion: number; uncertainty: number } | undefined;
  journal?: { expansion: number; uncertainty: number } | undefined;
  /** How far the parts were from 20 °C, °C; `undefined` where nobody knows. */
  temperatureOffset?: number | undefined;
  /** How many readings of the bore and of the journal the clearance is a mean of. */
  readings?: { bore: number; journal: number } | undefined;
  /** Readings that were repeated at one station, a group for each, m: they tell of the gauge's scatter of the day. */
  repeats?: { bore: readonly (readonly number[])[]; journal: readonly (readonly number[])[] } | undefined;
}

/** A thermometer and a part's own unevenness in a shop: ± 0.5 °C after soaking (common practice, no source). */
const temperatureHalfWidth = 0.5;

/** What bore and journal, soaked side by side, may differ by: ± 0.1 °C (common practice, no source). */
const differenceHalfWidth = 0.1;

/** Parts measured at an unknown temperature lie somewhere in a shop's day: 20 ± 5 °C (common practice, no source). */
const unknownTemperatureHalfWidth = 5;

/** Two people with three trials on two parts or so: what a small shop knows of its gauges (a guess, on purpose low). */
const usualDegreesOfFreedom = 10;

/** A gauge that nobody has described: it shows a tenth of a thou, and is off and repeats by half of that. */
export const unknownGauge: GaugeSpecification = {
  resolution: 2.54e-6,
  calibration: 1.27e-6,
  repeatability: 1.27e-6,
};

/**
 * Uncertainty of a diametral clearance (JCGM 100:2008): resolution of both gauges as rectangular, calibration,
 * repeatability, the parts' temperatures, and what their expansions are not known to.
 *
 * Comparative measuring cancels the micrometer's calibration, as its setting is both the journal's size and the
 * gauge's zero; how well it was set, its step and its scatter, still counts.
 * @throws EngineeringError `negative` or `not-positive` for figures that no gauge or part has
 */
export function clearanceUncertainty(input: ClearanceUncertaintyInput): Uncertainty {
  const { boreGauge, journalGauge, method, nominal, readings, repeats } = input;
  refuseUnsound(input);
  return combine([
    { what: "resolution of the bore gauge", uncertainty: rectangular(boreGauge.resolution / 2) },
    { what: "resolution of the journal gauge", uncertainty: rectangular(journalGauge.resolution / 2) },
    { what: "calibration of the bore gauge", uncertainty: boreGauge.calibration },
    ...(method === "absolute"
      ? [{ what: "calibration of the journal gauge", uncertainty: journalGauge.calibration }]
      : []),
    repeatabilityLine("repeatability of the bore gauge", boreGauge, readings?.bore, repeats?.bore),
    repeatabilityLine(
      "repeatability of the journal gauge",
      journalGauge,
      readings?.journal,
      repeats?.journal,
    ),
    ...temperatureLines(input, nominal),
  ]);
}

function refuseUnsound({ nominal, temperatureOffset = 0, ...input }: ClearanceUncertaintyInput): void {
  if (!(nominal > 0 && Number.isFinite(nominal))) {
    throw new EngineeringError("not-positive", "nominal", "A fit has a diameter over zero.");
  }
  if (!Number.isFinite(temperatureOffset)) {
    throw new EngineeringError("not-a-number", "temperatureOffset", "This temperature is no number.");
  }
  for (const gauge of ["boreGauge", "journalGauge"] as const) {
    for (const figure of ["resolution", "calibration", "repeatability"] as const) {
      const value = input[gauge][figure];
      if (value >= 0 && Number.isFinite(value)) continue;
      throw new EngineeringError("negative", `${gauge}.${figure}`, `A gauge's ${figure} is zero or more.`);
    }
  }
}

function repeatabilityLine(
  what: string,
  gauge: GaugeSpecification,
  readings = 1,
  repeats: readonly (readonly number[])[] = [],
): BudgetLine {
  const study = {
    standardDeviation: gauge.repeatability,
    degreesOfFreedom: gauge.repeatabilityDegreesOfFreedom ?? usualDegreesOfFreedom,
  };
  const today = repeatabilityOf(repeats);
  const { standardDeviation, degreesOfFreedom } = today ? pooled(study, today) : study;
  return { what, uncertainty: standardDeviation / Math.sqrt(Math.max(1, readings)), degreesOfFreedom };
}

function temperatureLines(input: ClearanceUncertaintyInput, nominal: number): BudgetLine[] {
  const { bore, journal, temperatureOffset } = input;
  if (!bore || !journal) return [];
  // Bore and journal soak together, so a common error counts with the difference of their expansions,
  // and each one's own unevenness with its own.
  const common = temperatureOffset === undefined ? unknownTemperatureHalfWidth : temperatureHalfWidth;
  const offset = Math.abs(temperatureOffset ?? rectangular(unknownTemperatureHalfWidth));
  return [
    {
      what: "temperature of both parts",
      uncertainty: nominal * Math.abs(bore.expansion - journal.expansion) * rectangular(common),
    },
    {
      what: "difference in temperature of the parts",
      uncertainty: nominal * Math.hypot(bore.expansion, journal.expansion) * rectangular(differenceHalfWidth),
    },
    { what: "expansion of the bore", uncertainty: nominal * offset * bore.uncertainty },
    { what: "expansion of the journal", uncertainty: nominal * offset * journal.uncertainty },
  ];
}
