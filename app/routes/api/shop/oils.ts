import { z } from "zod";
import { findOil, insertOil, listOils, type Oil } from "~/models/oil.server";
import { endpoint } from "../frame/endpoint";
import { paged, pageOf, pageQuery } from "../frame/page";
import { amount } from "../frame/quantity-in";
import { quantityOut, type Say } from "../frame/quantity-out";
import { line, name, remark, stored } from "./answers";

const oilAnswer = z
  .object({
    ...stored,
    name: z.string(),
    grade: z.string(),
    kv40: quantityOut,
    kv100: quantityOut,
    density15: quantityOut.nullable(),
    hths: quantityOut.nullable(),
    note: z.string(),
  })
  .meta({ id: "Oil" });

function sayOil(row: Oil, say: Say): z.input<typeof oilAnswer> {
  return {
    id: row.id,
    version: row.version,
    name: row.name,
    grade: row.grade,
    kv40: say.kinematic(row.kv40),
    kv100: say.kinematic(row.kv100),
    density15: row.density15 === null ? null : say.density(row.density15),
    hths: row.hths_pa_s === null ? null : say.viscosity(row.hths_pa_s),
    note: row.note,
  };
}

export const getOils = endpoint({
  method: "GET",
  path: "/oils",
  who: "oil:read",
  title: "The shop's oils, by name",
  query: pageQuery,
  answer: paged(oilAnswer),
  handle: async ({ scope, query, say }) => pageOf(await listOils(scope), query, (row) => sayOil(row, say)),
});

export const getOil = endpoint({
  method: "GET",
  path: "/oils/{oil}",
  who: "oil:read",
  title: "One oil",
  answer: oilAnswer,
  handle: async ({ scope, params, say }) => sayOil(await findOil(scope, params.oil), say),
});

const kinematic = amount("kinematic-viscosity", { over: 0 });

export const postOil = endpoint({
  method: "POST",
  path: "/oils",
  who: "oil:write",
  title: "Adds an oil",
  body: z.strictObject({
    name,
    grade: line(40).default(""),
    kv40: kinematic,
    kv100: kinematic,
    density15: amount("density", { over: 0 }).optional(),
    hths: amount("dynamic-viscosity", { over: 0 }).optional(),
    note: remark,
  }),
  status: 201,
  answer: oilAnswer,
  example: {
    name: "Oil A",
    grade: "20W-50",
    kv40: "160 cSt",
    kv100: "18.5 cSt",
    density15: "870 kg/m3",
    hths: "4.8 mPa s",
  },
  handle: async ({ scope, body, say }) => {
    const { hths, ...given } = body;
    return sayOil(await findOil(scope, await insertOil(scope, { ...given, hthsPaS: hths })), say);
  },
});
