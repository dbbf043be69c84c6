import { z } from "zod";
import { runEvents } from "~/engineering/trade/condition";
import { findBuild } from "~/models/build.server";
import { insertRun, listRuns, type Run } from "~/models/run.server";
import { endpoint } from "../frame/endpoint";
import { amount } from "../frame/quantity-in";
import { quantityOut, type Say } from "../frame/quantity-out";
import { inRpm, rpmOf } from "../frame/speed";
import { name, remark } from "./answers";
import { oilOfShop } from "./oil-of-shop.server";

/** A run as the API gives it. */
export const runAnswer = z
  .object({
    id: z.string(),
    kind: z.string(),
    started: z.string(),
    hours: z.number(),
    laps: z.int().nullable(),
    starts: z.int().nullable(),
    topSpeed: quantityOut.nullable(),
    oil: z.object({ id: z.string(), name: z.string() }),
    oilTemperature: quantityOut.nullable(),
    pressureIdle: quantityOut.nullable(),
    pressureAtSpeed: z.object({ pressure: quantityOut, speed: quantityOut }).nullable(),
    events: z.array(z.string()),
    note: z.string(),
    person: z.string(),
  })
  .meta({ id: "Run" });

export function sayRun(row: Run, say: Say): z.input<typeof runAnswer> {
  const { pressure_at_speed_pa: pressure, pressure_at_speed_rpm: rpm } = row;
  return {
    id: row.id,
    kind: row.kind,
    started: row.started_at,
    hours: row.hours,
    laps: row.laps,
    starts: row.starts,
    topSpeed: row.top_speed_rpm === null ? null : say.speed(rpmOf(row.top_speed_rpm)),
    oil: { id: row.oil_id, name: row.oilName },
    oilTemperature: row.oil_temperature_c === null ? null : say.temperature(row.oil_temperature_c),
    pressureIdle: row.pressure_idle_pa === null ? null : say.pressure(row.pressure_idle_pa),
    pressureAtSpeed:
      pressure === null || rpm === null
        ? null
        : { pressure: say.pressure(pressure), speed: say.speed(rpmOf(rpm)) },
    events: row.events,
    note: row.note,
    person: row.personName,
  };
}

// A clock may be a little ahead of ours; a day ahead is a slip.
const clockTolerance = 10 * 60 * 1000;

const started = z
  .union([z.iso.datetime({ offset: true }), z.iso.date()], {
    error: "This must be an instant of ISO 8601 with its zone, such as 2026-05-30T14:10:00Z, or a day.",
  })
  .transform((text) => new Date(text))
  .refine((date) => date.getTime() <= Date.now() + clockTolerance, {
    error: "This is in the future; a run is logged when it has been run.",
    params: { code: "in-the-future" },
  })
  .meta({
    description: "ISO 8601 with its zone, or a day; not in the future.",
    examples: ["2026-05-30T14:10:00Z"],
  });

const speed = amount("speed", { over: 0, most: rpmOf(30_000) });
const pressure = amount("pressure", { least: 0, most: 5e6 });

export const postRun = endpoint({
  method: "POST",
  path: "/builds/{build}/runs",
  who: "run:write",
  title: "Writes a run down",
  about:
    "The first run of an assembled build sets it running. `oil` is the id or the name of an oil of the shop; usual kinds are dyno, test, practice, qualifying, race.",
  body: z.strictObject({
    kind: name,
    started,
    hours: z.number().min(0).max(1000),
    laps: z.int().min(0).max(100_000).optional(),
    starts: z.int().min(0).max(10_000).optional(),
    topSpeed: speed.optional(),
    oil: name,
    oilTemperature: amount("temperature", { least: -40, most: 200 }).optional(),
    pressureIdle: pressure.optional(),
    pressureAtSpeed: z.strictObject({ pressure, speed }).optional(),
    events: z.array(z.enum(runEvents)).max(50).default([]),
    note: remark,
  }),
  status: 201,
  answer: runAnswer,
  example: {
    kind: "dyno",
    started: "2026-05-30T14:10:00Z",
    hours: 2.5,
    starts: 4,
    topSpeed: "9150 rpm",
    oil: "Oil A",
    oilTemperature: "105 degC",
    pressureIdle: "32 psi",
    pressureAtSpeed: { pressure: "68 psi", speed: "8500 rpm" },
    events: ["pressure-dip"],
  },
  handle: async ({ scope, params, body, say }) => {
    const build = await findBuild(scope, params.build);
    const id = await insertRun(scope, build, {
      kind: body.kind,
      startedAt: body.started,
      hours: body.hours,
      laps: body.laps,
      starts: body.starts,
      topSpeedRpm: body.topSpeed && inRpm(body.topSpeed),
      oilId: await oilOfShop(scope, body.oil),
      oilTemperatureC: body.oilTemperature,
      pressureIdlePa: body.pressureIdle,
      pressureAtSpeedPa: body.pressureAtSpeed?.pressure,
      pressureAtSpeedRpm: body.pressureAtSpeed && inRpm(body.pressureAtSpeed.speed),
      events: [...new Set(body.events)],
      note: body.note,
    });
    return sayRun((await listRuns(scope, build.id)).find((one) => one.id === id)!, say);
  },
});
