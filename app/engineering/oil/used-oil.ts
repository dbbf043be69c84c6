import { requireWithin } from "../cycle/sound-input";
import { requireViscosity } from "./oil-data";
import { doubleLog } from "./walther";

/** Viscosity of the fuel that stays in hot oil, the heavy end of petrol, at 100 °C, mm²/s: our own assumption. */
const petrolAt100 = 0.5;

/** Change of viscosity that two measurements of two samples can show between them: our own assumption. */
const smallestSeen = 0.02;

/** New and used oil at the same temperature, mm²/s. */
export interface OilLoss {
  newViscosity: number;
  usedViscosity: number;
  /** Of the fuel at that temperature, mm²/s; petrol's heavy end at 100 °C where it is not given. */
  fuelViscosity?: number;
}

export interface FuelDilution {
  /** Share of viscosity lost; negative where the oil has thickened. */
  loss: number;
  /** False where the loss is within what the measurements can show: then `most` is the bound, and 0 may be true. */
  measurable: boolean;
  /** Share of fuel by volume if the loss is all fuel: between these two. */
  least: number;
  most: number;
  assumptions: string[];
}

/**
 * How much fuel an oil's loss of viscosity can mean. Two mixing rules bound it: double logarithms by volume
 * (ASTM D7152, thins most for a share of fuel) and plain logarithms (Arrhenius, thins least); both recalled.
 * Range: 0.21–10⁵ mm²/s, fuel at most half as viscous as the oil.
 * @throws EngineeringError `not-a-number`, `not-positive`, `outside-range`
 */
export function fuelDilution({
  newViscosity,
  usedViscosity,
  fuelViscosity = petrolAt100,
}: OilLoss): FuelDilution {
  requireViscosity(newViscosity, "newViscosity");
  requireWithin(fuelViscosity, "fuelViscosity", { from: 0.21, to: newViscosity / 2, unit: "mm²/s" });
  requireWithin(usedViscosity, "usedViscosity", { from: fuelViscosity, to: 1e5, unit: "mm²/s" });
  const loss = 1 - usedViscosity / newViscosity;
  const shareBy = (scale: (viscosity: number) => number, viscosity: number) =>
    Math.max(0, (scale(newViscosity) - scale(viscosity)) / (scale(newViscosity) - scale(fuelViscosity)));
  const measurable = loss > smallestSeen;
  const boundAt = measurable ? usedViscosity : newViscosity * (1 - smallestSeen);
  return {
    loss,
    measurable,
    least: measurable ? shareBy(doubleLog, usedViscosity) : 0,
    most: shareBy(Math.log, boundAt),
    assumptions: [
      "All of the loss is taken as fuel. A multigrade also loses viscosity by shear, so there may be less.",
      "The oil is taken as not thickened by soot or oxidation. Where it is, there may be more.",
      `The fuel is taken as ${fuelViscosity} mm²/s at the temperature of the measurement.`,
    ],
  };
}

/** A sample of the sump: what the laboratory found of one metal, ppm by mass. */
export interface MetalSample {
  /** Hours on the engine when it was drawn. */
  hours: number;
  ppm: number;
}

export interface SumpHistory {
  before: MetalSample;
  after: MetalSample;
  /** Oil in the engine, m³. */
  sumpVolume: number;
  /** Fresh oil put in between the samples to replace what was lost, m³. */
  toppedUp?: number;
  /** The metal in fresh oil, ppm. */
  freshPpm?: number;
}

export interface MetalRate {
  /** Metal shed, as the rise of concentration in a full sump, ppm/h. */
  rate: number;
  /** What the two samples alone would say, ppm/h. */
  withoutTopUps: number;
}

/**
 * How fast an engine sheds a wear metal into its oil. Lost oil takes its metal along and fresh oil replaces it evenly
 * over the hours, so the concentration c follows dc/dt = rate − (q/V)(c − fresh); what the filter keeps is not seen.
 * Range: at least 0.01 h between samples, topped up at most five sumps. A balance of mass, our own.
 * @throws EngineeringError `not-a-number`, `not-positive`, `outside-range`
 */
export function wearMetalRate({
  before,
  after,
  sumpVolume,
  toppedUp = 0,
  freshPpm = 0,
}: SumpHistory): MetalRate {
  const ppm = { from: 0, to: 1e5, unit: "ppm" };
  requireWithin(before.ppm, "before.ppm", ppm);
  requireWithin(after.ppm, "after.ppm", ppm);
  requireWithin(freshPpm, "freshPpm", ppm);
  requireWithin(before.hours, "before.hours", { from: 0, to: 1e6, unit: "h" });
  requireWithin(after.hours, "after.hours", { from: before.hours + 0.01, to: 1e6, unit: "h" });
  requireWithin(sumpVolume, "sumpVolume", { from: 1e-5, to: 1, unit: "m³" });
  requireWithin(toppedUp, "toppedUp", { from: 0, to: 5 * sumpVolume, unit: "m³" });
  const hours = after.hours - before.hours;
  const renewed = toppedUp / sumpVolume;
  const kept = Math.exp(-renewed);
  const replaced = renewed === 0 ? 1 : renewed / -Math.expm1(-renewed);
  return {
    rate: ((after.ppm - freshPpm - kept * (before.ppm - freshPpm)) * replaced) / hours,
    withoutTopUps: (after.ppm - before.ppm) / hours,
  };
}
