import { EngineeringError } from "../engineering-error";
import type { Bearing } from "./bearing";
import { type BigEndLoad, bigEndLoad, type Cylinder } from "./big-end-load";
import { degrees, engineCycleAngle } from "./crank-angle";
import type { CrankLayout } from "./crank-layout";
import { ambientPressure, type CylinderPressure, type GasCycle, gasPressure } from "./gas-pressure";
import type { LoadPoint } from "./load-cycle";
import { type CrankBalance, mainLoads } from "./main-load";
import type { FilmModel } from "./mobility";
import { type Orbit, orbit } from "./orbit";
import { type TracePoint, tracePressure } from "./pressure-trace";
import { requireSliderCrank } from "./slider-crank";
import { requireWithin } from "./sound-input";

/** An engine at one speed and load: its cylinder, and the gas by a model or by a trace. */
export type EngineDuty = Cylinder & {
  /** Of the crank, rad/s. */
  speed: number;
} & ((GasCycle & { pressureTrace?: undefined }) | { pressureTrace: readonly TracePoint[] });

/** The oil film of one bearing in an engine. */
export interface FilmDuty {
  bearing: Bearing;
  /** Of the oil in the film, Pa·s. */
  viscosity: number;
  film?: FilmModel | "auto";
}

/** A bearing's orbit with the loads that drive it. */
export interface BearingCycle extends Orbit {
  loads: LoadPoint[];
}

/** A big end's cycle and what the gas model took for itself; null where the pressure came from a trace. */
export interface EngineCycle extends BearingCycle {
  gas: Pick<CylinderPressure, "compressionRatio" | "intakePressure"> | null;
}

/**
 * The big end of an engine over its cycle: loads in the rod's frame (x along the rod to the wrist pin), from gas and
 * masses, and the journal's orbit under them. In that frame the shell stands and the crankpin turns at the crank's
 * speed and the rod's swing together. Crank angle 0 is top dead centre of firing.
 * @throws EngineeringError as the parts it is made of
 */
export function engineCycle({ engine, ...film }: FilmDuty & { engine: EngineDuty }): EngineCycle {
  const { load, gas } = loadsOf(engine);
  return { ...run(everyDegree(load), engine.speed, film), gas };
}

/** All the bearings of an engine. */
export interface WholeEngine {
  engine: EngineDuty;
  layout: CrankLayout;
  /** By cylinder number, from 1. */
  bigEnds: readonly Bearing[];
  /** From the front. */
  mains: readonly Bearing[];
  viscosity: number;
  balance?: CrankBalance;
  film?: FilmModel | "auto";
}

/**
 * Every big end (by cylinder, each in its own rod's frame with 0 at its own firing) and every main (from the front, in
 * the block's frame) of an engine whose cylinders are alike; each position has its own bearing.
 * @throws EngineeringError `bearing-count` where the bearings are not as many as the layout's, and as `engineCycle`
 */
export function allBearings({ engine, layout, bigEnds, mains, balance, ...oil }: WholeEngine) {
  requireAsMany(bigEnds.length, layout.axes.length, "bigEnds");
  requireAsMany(mains.length, layout.mains, "mains");
  const { load } = loadsOf(engine);
  const rodLoads = everyDegree(load);
  const blockLoads = mainLoads(layout, load, engine.speed, balance);
  return {
    bigEnds: bigEnds.map((bearing) => run(rodLoads, engine.speed, { bearing, ...oil })),
    mains: mains.map((bearing, index) => run(blockLoads[index]!, engine.speed, { bearing, ...oil })),
  };
}

function run(loads: LoadPoint[], speed: number, duty: FilmDuty): BearingCycle {
  return { ...orbit({ ...duty, loads, speed, sleeveFixed: true }), loads };
}

/** A big end's loads at every degree. */
function everyDegree(load: (crankAngle: number) => BigEndLoad): LoadPoint[] {
  return Array.from({ length: Math.round(engineCycleAngle / degrees) }, (_, index) => {
    const crankAngle = index * degrees;
    const { x, y, journalSpeed } = load(crankAngle);
    return { crankAngle, x, y, journalSpeed };
  });
}

/** The load of an engine's big end by crank angle, its cylinder checked first. */
function loadsOf(engine: EngineDuty) {
  requireCylinder(engine);
  const gas = engine.pressureTrace ? null : gasPressure(engine, engine);
  const pressure = engine.pressureTrace ? tracePressure(engine.pressureTrace) : gas!.at;
  const area = (Math.PI / 4) * engine.bore ** 2;
  return {
    load: (crankAngle: number) =>
      bigEndLoad(engine, crankAngle, engine.speed, area * (pressure(crankAngle) - ambientPressure)),
    gas: gas && { compressionRatio: gas.compressionRatio, intakePressure: gas.intakePressure },
  };
}

function requireCylinder(engine: EngineDuty): void {
  requireWithin(engine.bore, "engine.bore", { from: 0.005, to: 2, unit: "m" });
  requireSliderCrank(engine);
  requireWithin(engine.reciprocatingMass, "engine.reciprocatingMass", { from: 0, to: 2000, unit: "kg" });
  requireWithin(engine.rotatingMass, "engine.rotatingMass", { from: 0, to: 2000, unit: "kg" });
  requireWithin(engine.speed, "engine.speed", { from: 0.1, to: 1e4, unit: "rad/s" });
}

function requireAsMany(given: number, needed: number, field: string): void {
  if (given !== needed) {
    throw new EngineeringError(
      "bearing-count",
      field,
      `The layout has ${needed} positions here; ${given} bearings are given.`,
    );
  }
}
