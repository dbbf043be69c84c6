import { usualDensity15 } from "../oil/density";
import { shearedShare } from "../oil/high-shear";
import type { SteadyDuty } from "./duty";
import { specificHeat } from "./heat-balance";

/** What a steady film rests on and cannot see, a sentence each, for the inputs it was given. */
export function assumptionsOf({ oil, feed }: SteadyDuty): string[] {
  return [
    "The bearing is round, rigid and in line, its film whole from the widest gap on and one viscosity throughout; load and speed are steady.",
    "Friction is counted as if the film were whole all round, as the published tables count it; where the film has torn the real friction is lower.",
    heatRules[feed?.kind ?? "none"],
    `All friction warms the oil, at ${specificHeat} J/(kg K) (Shigley): hot oil holds up to a fifth more, so the real rise is rather lower.`,
    ...(oil ? oilAssumptions(oil) : []),
  ];
}

const heatRules = {
  none: "The film is at supply plus half the rise. Heat leaves with the inflow, its side flow half-way warm (Raimondi and Boyd; Shigley 12-15). No supply pressure is counted.",
  hole: "The film is at supply plus half the rise. Heat leaves with the side flow and what the supply pressure drives through the hole at the widest gap (ISO 7902, from memory).",
  groove:
    "The film is at supply plus half the rise. Heat leaves only with what the supply pressure drives out of the groove (Shigley, pressure-fed bearings): the wedge pumps more, so the real rise is lower.",
};

function oilAssumptions(oil: NonNullable<SteadyDuty["oil"]>): string[] {
  return [
    oil.density15 === undefined
      ? `The oil's density is not known and taken as ${usualDensity15} kg/m³ at 15 °C.`
      : undefined,
    oil.hths === undefined
      ? "No HTHS is given: the oil is not thinned by shear here, a multigrade's real film is thinner."
      : `Shear takes ${Math.round(100 * (1 - shearedShare(oil)))} % of the viscosity, as HTHS says at 150 °C, held at every temperature: our own assumption, on the thin side where the film is sheared less.`,
  ].filter((sentence) => sentence !== undefined);
}
