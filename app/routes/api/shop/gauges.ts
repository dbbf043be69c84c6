import { z } from "zod";
import { metres } from "~/engineering/quantity/length";
import { findGauge, type Gauge, insertGauge, listGauges } from "~/models/gauge.server";
import { endpoint } from "../frame/endpoint";
import { paged, pageOf, pageQuery } from "../frame/page";
import { quantity } from "../frame/quantity-in";
import { quantityOut, type Say } from "../frame/quantity-out";
import { line, name, stored } from "./answers";

const gaugeAnswer = z
  .object({
    ...stored,
    name: z.string(),
    kind: z.string(),
    serial: z.string(),
    resolution: quantityOut,
    calibration: quantityOut,
    repeatability: quantityOut,
    due: z.string().nullable(),
  })
  .meta({ id: "Gauge" });

function sayGauge(row: Gauge, say: Say): z.input<typeof gaugeAnswer> {
  return {
    id: row.id,
    version: row.version,
    name: row.name,
    kind: row.kind,
    serial: row.serial,
    resolution: say.fine(metres(row.resolution_pm)),
    calibration: say.fine(metres(row.calibration_pm)),
    repeatability: say.fine(metres(row.repeatability_pm)),
    due: row.due_on,
  };
}

export const getGauges = endpoint({
  method: "GET",
  path: "/gauges",
  who: "gauge:read",
  title: "The shop's gauges, by name",
  query: pageQuery,
  answer: paged(gaugeAnswer),
  handle: async ({ scope, query, say }) =>
    pageOf(await listGauges(scope), query, (row) => sayGauge(row, say)),
});

export const getGauge = endpoint({
  method: "GET",
  path: "/gauges/{gauge}",
  who: "gauge:read",
  title: "One gauge",
  answer: gaugeAnswer,
  handle: async ({ scope, params, say }) => sayGauge(await findGauge(scope, params.gauge), say),
});

const figure = quantity("small-length", { least: 0, most: 0.001 });

export const postGauge = endpoint({
  method: "POST",
  path: "/gauges",
  who: "gauge:write",
  title: "Adds a gauge",
  about: "Resolution is the step it shows; calibration and repeatability are standard uncertainties (1 σ).",
  body: z.strictObject({
    name,
    kind: name,
    serial: line().default(""),
    resolution: figure,
    calibration: figure,
    repeatability: figure,
    due: z.iso.date().optional(),
  }),
  status: 201,
  answer: gaugeAnswer,
  example: {
    name: "Bore gauge 2",
    kind: "bore gauge",
    serial: "B-17",
    resolution: "0.0001 in",
    calibration: "0.00004 in",
    repeatability: "0.00003 in",
    due: "2027-03-01",
  },
  handle: async ({ scope, body, say }) => {
    const { due, ...given } = body;
    return sayGauge(await findGauge(scope, await insertGauge(scope, { ...given, dueOn: due })), say);
  },
});
