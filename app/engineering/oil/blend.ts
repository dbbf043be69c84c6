import { requireWithin } from "../cycle/sound-input";
import { type OilData, requireOil, requireViscosity } from "./oil-data";
import { doubleLog, fromDoubleLog } from "./walther";

/**
 * Kinematic viscosity of a blend of two liquids at one temperature, mm²/s: their double logarithms by volume.
 * Range: `firstShare` 0–1, viscosities 0.21–10⁵ mm²/s. Expected error: a few per cent for oils of one kind; polymer
 * and additives do not follow the rule.
 * Source: ASTM D7152, the ASTM blending method (recalled; its scope was read).
 * @throws EngineeringError `not-a-number`, `not-positive`, `outside-range`
 */
export function blendViscosity(first: number, second: number, firstShare: number): number {
  requireViscosity(first, "first");
  requireViscosity(second, "second");
  requireWithin(firstShare, "firstShare", { from: 0, to: 1, unit: "(a share)" });
  return fromDoubleLog(firstShare * doubleLog(first) + (1 - firstShare) * doubleLog(second));
}

/**
 * A blend of two oils by volume: KV40 and KV100 each by `blendViscosity`, density by volume where both are known.
 * HTHS is left out: no rule of blending gives it.
 * @throws EngineeringError as `requireOil` and `blendViscosity`
 */
export function blend(first: OilData, second: OilData, firstShare: number): OilData {
  requireOil(first);
  requireOil(second);
  const densities = [first.density15, second.density15] as const;
  return {
    kv40: blendViscosity(first.kv40, second.kv40, firstShare),
    kv100: blendViscosity(first.kv100, second.kv100, firstShare),
    ...(densities[0] !== undefined &&
      densities[1] !== undefined && {
        density15: firstShare * densities[0] + (1 - firstShare) * densities[1],
      }),
  };
}
