import { z } from "zod";
import { positionClearance } from "~/engineering/clearance/position-clearance";
import { referenceTemperatureC } from "~/engineering/temperature/expansion";
import { findMaterial, materials } from "~/engineering/temperature/materials";
import { clearanceUncertainty, unknownGauge } from "~/engineering/uncertainty/clearance-uncertainty";
import { endpoint } from "../frame/endpoint";
import { amount } from "../frame/quantity-in";
import { quantityOut } from "../frame/quantity-out";
import { box } from "../shop/reading-box";

const reading = z.strictObject({
  plane: box.plane,
  axis: box.axis,
  value: amount("length", { over: 0, most: 2 }),
  temperature: amount("temperature", { least: -40, most: 200 }).optional(),
});

type Reading = z.output<typeof reading>;

const figure = amount("small-length", { least: 0, most: 0.001 });
const gauge = z.strictObject({ resolution: figure, calibration: figure, repeatability: figure });
const material = z
  .enum(materials.map(({ key }) => key))
  .transform((key) => findMaterial(key))
  .meta({ description: "By its key; with a temperature it brings the readings to 20 °C." });

const optional = quantityOut.nullable();

const body = z.strictObject({
  bore: z.array(reading).max(200).default([]),
  journal: z.array(reading).max(200).default([]),
  boreMaterial: material.optional(),
  journalMaterial: material.optional(),
  boreGauge: gauge.optional(),
  journalGauge: gauge.optional(),
  method: z.enum(["absolute", "comparative"]).default("absolute"),
});

export const postClearance = endpoint({
  method: "POST",
  path: "/calc/clearance",
  who: "token",
  title: "The clearance of one position from any bore and journal readings, with its uncertainty",
  about:
    "Readings of the same plane and axis are repeats. Absolute: both gauges' calibrations count; comparative: the bore gauge was zeroed on the journal's micrometer setting, whose error cancels. A gauge that is not given counts as one that shows 0.0001 in.",
  body,
  answer: z.object({
    vertical: optional,
    least: optional,
    most: optional,
    mean: optional,
    boreOutOfRound: optional,
    journalOutOfRound: optional,
    boreTaper: optional,
    journalTaper: optional,
    boreShape: z.string().nullable(),
    journalShape: z.string().nullable(),
    at20: z.boolean().meta({ description: "Whether every reading could be brought to 20 °C." }),
    interference: z.boolean(),
    uncertainty: z
      .object({
        expanded: quantityOut,
        coverage: z.number(),
        combined: quantityOut,
        degreesOfFreedom: z.number().nullable(),
        budget: z.array(
          z.object({
            what: z.string(),
            uncertainty: quantityOut,
            share: z.number(),
            degreesOfFreedom: z.number().nullable(),
          }),
        ),
      })
      .nullable(),
    missing: z.array(z.string()),
  }),
  example: {
    bore: [
      { plane: "front", axis: "vertical", value: "2.1026 in", temperature: "22 degC" },
      { plane: "rear", axis: "vertical", value: "2.1025 in", temperature: "22 degC" },
    ],
    journal: [{ plane: "front", axis: "a", value: "2.1000 in", temperature: "22 degC" }],
    boreMaterial: "steel-4340",
    journalMaterial: "steel-4340",
    method: "comparative",
  },
  handle: ({ body: given, say }) => {
    const clearance = positionClearance({
      bore: given.bore.map(diameter),
      journal: given.journal.map(diameter),
      boreExpansion: given.boreMaterial?.expansion,
      journalExpansion: given.journalMaterial?.expansion,
    });
    const orNull = (value: number | undefined, as: (si: number) => z.infer<typeof quantityOut>) =>
      value === undefined ? null : as(value);
    return {
      vertical: orNull(clearance.vertical, say.clearance),
      least: orNull(clearance.least, say.clearance),
      most: orNull(clearance.most, say.clearance),
      mean: orNull(clearance.mean, say.clearance),
      boreOutOfRound: orNull(clearance.boreOutOfRound, say.clearance),
      journalOutOfRound: orNull(clearance.journalOutOfRound, say.clearance),
      boreTaper: orNull(clearance.boreTaper, say.clearance),
      journalTaper: orNull(clearance.journalTaper, say.clearance),
      boreShape: clearance.boreShape ?? null,
      journalShape: clearance.journalShape ?? null,
      at20: clearance.at20,
      interference: clearance.interference,
      uncertainty: clearance.mean === undefined ? null : uncertainty(given, clearance, say),
      missing: [...clearance.missing, ...notAt20(given, clearance.at20)],
    };
  },
});

const diameter = ({ temperature, ...rest }: Reading) => ({ ...rest, temperatureC: temperature });

type Given = z.output<typeof body>;

function uncertainty(
  given: Given,
  { journal, at20 }: ReturnType<typeof positionClearance>,
  say: { fine: (m: number) => z.infer<typeof quantityOut> },
) {
  const offsets = [...given.bore, ...given.journal].map(({ temperature }) =>
    Math.abs((temperature ?? referenceTemperatureC) - referenceTemperatureC),
  );
  const result = clearanceUncertainty({
    boreGauge: given.boreGauge ?? unknownGauge,
    journalGauge: given.journalGauge ?? unknownGauge,
    method: given.method,
    nominal: journal!,
    bore: given.boreMaterial,
    journal: given.journalMaterial,
    temperatureOffset: at20 ? Math.max(...offsets) : undefined,
    readings: { bore: onLoadLine(given.bore), journal: given.journal.length },
    repeats: { bore: repeatsOf(given.bore), journal: repeatsOf(given.journal) },
  });
  return {
    expanded: say.fine(result.expanded),
    coverage: result.coverage,
    combined: say.fine(result.combined),
    degreesOfFreedom: result.effectiveDegreesOfFreedom ?? null,
    budget: result.budget.map((line) => ({
      ...line,
      uncertainty: say.fine(line.uncertainty),
      degreesOfFreedom: line.degreesOfFreedom ?? null,
    })),
  };
}

// The clearance of record is a mean of the bore's readings across the load line.
const onLoadLine = (bore: readonly Reading[]) =>
  bore.filter(({ axis }) => axis === "vertical").length || bore.length;

function repeatsOf(readings: readonly Reading[]): number[][] {
  const stations = new Set(readings.map(stationOf));
  return [...stations].map((station) =>
    readings.filter((reading) => stationOf(reading) === station).map(({ value }) => value),
  );
}

const stationOf = ({ plane, axis }: Reading) => `${plane} ${axis}`;

function notAt20(given: Given, at20: boolean): string[] {
  if (at20) return [];
  const parts = [
    given.bore.length > 0 && !given.boreMaterial ? "the bore's material" : "",
    given.journal.length > 0 && !given.journalMaterial ? "the journal's material" : "",
    [...given.bore, ...given.journal].some(({ temperature }) => temperature === undefined)
      ? "a temperature"
      : "",
  ].filter(Boolean);
  return [`Not given: ${parts.join(", ")}. Readings stand as they were read, not at 20 °C.`];
}
