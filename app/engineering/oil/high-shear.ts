import { requireWithin } from "../cycle/sound-input";
import { EngineeringError } from "../engineering-error";
import type { OilData } from "./oil-data";
import { dynamicLine } from "./viscosity";

/**
 * The share of its viscosity that an oil keeps at 10⁶ /s, from its HTHS at 150 °C; 1 where HTHS is not known.
 * An HTHS up to 5 % over the unsheared viscosity is taken as the two measurements' scatter, more is refused.
 * @throws EngineeringError `hths-above-unsheared`, and as `dynamicLine`
 */
export function shearedShare(oil: OilData): number {
  if (oil.hths === undefined) return 1;
  requireWithin(oil.hths, "hths", { from: 1e-4, to: 0.1, unit: "Pa·s" });
  const unsheared = dynamicLine(oil)(150);
  const share = oil.hths / unsheared;
  if (share <= 1.05) return Math.min(1, share);
  throw new EngineeringError(
    "hths-above-unsheared",
    "hths",
    `Shear thins an oil, but the HTHS of ${(oil.hths * 1e3).toPrecision(3)} mPa·s is above the ${(unsheared * 1e3).toPrecision(3)} mPa·s that KV40 and KV100 give at 150 °C.`,
  );
}

/**
 * Dynamic viscosity of an oil at a temperature under the shear of a running bearing, Pa·s, as a function of °C.
 * The share of viscosity kept at 150 °C and 10⁶ /s is held at every temperature: our own assumption. It is exact where
 * HTHS is measured, and errs to the thin side where the film is sheared less or the oil is colder.
 */
export function shearedLine(oil: OilData): (temperatureC: number) => number {
  const share = shearedShare(oil);
  const unsheared = dynamicLine(oil);
  return (temperatureC) => share * unsheared(temperatureC);
}
