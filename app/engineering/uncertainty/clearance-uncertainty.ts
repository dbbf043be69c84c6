import { type BudgetLine, combine, rectangular, type Uncertainty } from "./budget";

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
}

/** A thermometer and a part's own unevenness in a shop: ± 0.5 °C after soaking (common practice). */
const temperatureHalfWidth = 0.5;

/** Parts measured at an unknown temperature lie somewhere in a shop's day: 20 ± 5 °C (common practice). */
const unknownTemperatureHalfWidth = 5;

/** A gauge that nobody has described: what its last digit allows, a tenth of a thou, and repeats like it. */
export const unknownGauge: GaugeSpecification = {
  resolution: 2.54e-6,
  calibration: 1.27e-6,
  repeatability: 1.27e-6,
};

/**
 * Uncertainty of a diametral clearance (JCGM 100:2008): resolution of both gauges as rectangular, calibration,
 * repeatability, the parts' difference in temperature, and what their expansions are not known to.
 * Comparative measuring cancels the micrometer's calibration: its setting is both the journal's size and the gauge's zero.
 */
export function clearanceUncertainty(input: ClearanceUncertaintyInput): Uncertainty {
  const { boreGauge, journalGauge, method, nominal } = input;
  const readings = input.readings ?? { bore: 1, journal: 1 };
  const lines: BudgetLine[] = [
    line("resolution of the bore gauge", rectangular(boreGauge.resolution / 2)),
    line("resolution of the journal gauge", rectangular(journalGauge.resolution / 2)),
    line("calibration of the bore gauge", boreGauge.calibration),
    ...(method === "absolute" ? [line("calibration of the journal gauge", journalGauge.calibration)] : []),
    repeatability("repeatability of the bore gauge", boreGauge, readings.bore),
    repeatability("repeatability of the journal gauge", journalGauge, readings.journal),
    ...temperatureLines(input, nominal),
  ];
  return combine(lines);
}

const line = (what: string, uncertainty: number): BudgetLine => ({
  what,
  uncertainty,
  degreesOfFreedom: Number.POSITIVE_INFINITY,
});

function repeatability(what: string, gauge: GaugeSpecification, readings: number): BudgetLine {
  return {
    what,
    uncertainty: gauge.repeatability / Math.sqrt(Math.max(1, readings)),
    degreesOfFreedom: gauge.repeatabilityDegreesOfFreedom ?? 10,
  };
}

function temperatureLines(input: ClearanceUncertaintyInput, nominal: number): BudgetLine[] {
  const { bore, journal, temperatureOffset } = input;
  if (!bore || !journal) return [];
  // Bore and journal soak together, so a common error counts with the difference of their expansions,
  // and each one's own unevenness with its own.
  const common = temperatureOffset === undefined ? unknownTemperatureHalfWidth : temperatureHalfWidth;
  const own = rectangular(temperatureHalfWidth / 5);
  const offset = Math.abs(temperatureOffset ?? 0);
  return [
    line(
      "temperature of both parts",
      nominal * Math.abs(bore.expansion - journal.expansion) * rectangular(common),
    ),
    line(
      "difference in temperature of the parts",
      nominal * Math.hypot(bore.expansion, journal.expansion) * own,
    ),
    line("expansion of the bore", nominal * offset * bore.uncertainty),
    line("expansion of the journal", nominal * offset * journal.uncertainty),
  ];
}
