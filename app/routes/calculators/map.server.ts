import { filmMap } from "~/engineering/film/film-map";
import { combinedRoughness } from "~/engineering/film/roughness";
import type { PageUnits } from "~/engineering/quantity/figures";
import {
  bearingFields,
  dutyFields,
  readBearing,
  readClearance,
  readDuty,
  readRoughness,
  roughnessFields,
} from "./bearing-fields.server";
import { AskedFields } from "./fields.server";

export const mapFields = [
  ...bearingFields.filter(({ name }) => name !== "clearance"),
  { name: "clearanceFrom", label: "Clearance from", hint: "Diametral" },
  { name: "clearanceTo", label: "Clearance to" },
  { name: "viscosityFrom", label: "Viscosity from", hint: "mPa·s" },
  { name: "viscosityTo", label: "Viscosity to", hint: "mPa·s" },
  ...dutyFields,
  ...roughnessFields,
];

/** Least film over clearance and viscosity at one duty; with roughness the line where λ is 1. */
export async function calculateMap(searched: URLSearchParams, units: PageUnits) {
  const asked = new AskedFields(searched);
  const page = { typed: asked.typed, errors: asked.errors };
  if (asked.isEmpty) return { ...page, result: undefined };
  const viscosity = { kind: "dynamic-viscosity", unit: "mPa s" } as const;
  const from = await readClearance(asked, units, "clearanceFrom");
  const to = await readClearance(asked, units, "clearanceTo");
  const thinnest = await asked.required("viscosityFrom", viscosity);
  const thickest = await asked.required("viscosityTo", viscosity);
  const duty = { ...(await readBearing(asked, units)), ...(await readDuty(asked)) };
  const roughness = await readRoughness(asked, units);
  const result = asked.result(() => {
    const map = filmMap({
      ...duty,
      clearances: { from, to, count: 41 },
      viscosities: { from: thinnest, to: thickest, count: 31 },
      roughness,
    });
    return {
      clearances: map.clearances,
      viscosities: map.viscosities,
      leastFilm: map.leastFilm.map((row) => row.map((film) => Number(film.toPrecision(4)))),
      limitFilm: roughness && combinedRoughness(roughness),
      outsideRange: map.outsideRange.some((row) => row.includes(true)),
    };
  });
  return { ...page, result };
}
