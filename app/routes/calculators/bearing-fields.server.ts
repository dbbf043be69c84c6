import { clearanceUnitName, diameterUnitName, type PageUnits } from "~/engineering/quantity/figures";
import type { AskedFields } from "./fields.server";

/** The fields of a bearing and its oil that the film calculators share. */
export const bearingFields = [
  { name: "diameter", label: "Journal diameter" },
  { name: "length", label: "Bearing length" },
  { name: "clearance", label: "Clearance", hint: "Diametral" },
];

export const dutyFields = [
  { name: "speed", label: "Speed of the journal", hint: "rpm" },
  { name: "load", label: "Load", hint: "N, kN or lbf" },
  { name: "specificLoad", label: "or specific load", hint: "MPa or psi" },
];

export const roughnessFields = [
  { name: "boreRoughness", label: "Bore finish, Ra" },
  { name: "journalRoughness", label: "Journal finish, Ra" },
];

/** A bearing's sizes, m. */
export async function readBearing(asked: AskedFields, units: PageUnits) {
  const length = { kind: "length", unit: diameterUnitName(units) } as const;
  return {
    diameter: await asked.required("diameter", length),
    length: await asked.required("length", length),
  };
}

/** A diametral clearance, m. */
export function readClearance(asked: AskedFields, units: PageUnits, name = "clearance"): Promise<number> {
  return asked.required(name, { kind: "small-length", unit: clearanceUnitName(units) });
}

/** Speed in rad/s with the load in N or the specific load in Pa. */
export async function readDuty(asked: AskedFields) {
  return {
    speed: await asked.required("speed", { kind: "speed", unit: "rpm" }),
    load: await asked.quantity("load", { kind: "force", unit: "N" }),
    specificLoad: await asked.quantity("specificLoad", { kind: "pressure", unit: "MPa" }),
  };
}

/** Ra of both faces, m; undefined unless both are given. */
export async function readRoughness(asked: AskedFields, units: PageUnits) {
  const finish = { kind: "finish", unit: units === "inch" ? "uin" : "um" } as const;
  const bore = await asked.quantity("boreRoughness", finish);
  const journal = await asked.quantity("journalRoughness", finish);
  return bore === undefined || journal === undefined ? undefined : { bore, journal };
}

/** The dynamic viscosity in the film, Pa·s, where it is given. */
export function readViscosity(asked: AskedFields, name = "viscosity"): Promise<number | undefined> {
  return asked.quantity(name, { kind: "dynamic-viscosity", unit: "mPa s" });
}
