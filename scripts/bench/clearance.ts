import { positionClearance } from "../../app/engineering/clearance/position-clearance";
import { findMaterial } from "../../app/engineering/temperature/materials";
import { fitKind } from "../../app/engineering/trade/fit-kinds";
import { clearanceUncertainty } from "../../app/engineering/uncertainty/clearance-uncertainty";
import { type Measurement, typically } from "./typically";

const steel = findMaterial("steel-4340");
const iron = findMaterial("gray-iron");
const gauge = { resolution: 1.27e-6, calibration: 1e-6, repeatability: 0.6e-6 };

const readings = (feature: "bore" | "journal", diameter: number) =>
  fitKind("big-end")
    .stations.filter((station) => station.feature === feature)
    .map(({ plane, axis }, index) => ({ plane, axis, value: diameter + index * 4e-7, temperatureC: 22.5 }));

const bore = readings("bore", 0.0534);
const journal = readings("journal", 0.05334);

/** The speed goal of one position of ten readings, in half a second. */
export function bench(): Measurement[] {
  return [
    {
      what: "one position's clearance with uncertainty",
      goal: 50e-6,
      seconds: typically(1000, () => {
        const clearance = positionClearance({
          bore,
          journal,
          boreExpansion: iron.expansion,
          journalExpansion: steel.expansion,
        });
        const uncertainty = clearanceUncertainty({
          boreGauge: gauge,
          journalGauge: gauge,
          method: "absolute",
          nominal: 0.05334,
          bore: iron,
          journal: steel,
          temperatureOffset: 2.5,
          readings: { bore: 2, journal: 4 },
        });
        return [clearance, uncertainty];
      }),
    },
  ];
}
