import { z } from "zod";
import { metres } from "~/engineering/quantity/length";
import { findBuild } from "~/models/build.server";
import { listReadings } from "~/models/reading.server";
import { endpoint } from "../frame/endpoint";
import { paged, pageOf, pageQuery } from "../frame/page";
import { quantityOut } from "../frame/quantity-out";
import { box, stages, warning } from "./reading-box";

export const getReadings = endpoint({
  method: "GET",
  path: "/builds/{build}/readings",
  who: "engine:read",
  title: "Every reading of a build ever taken, oldest first; superseded ones are marked",
  query: { ...pageQuery, stage: stages.optional() },
  answer: paged(
    z
      .object({
        id: z.string(),
        stage: stages,
        fit: z.string(),
        position: z.int(),
        ...box,
        repeat: z.int(),
        state: z.enum(["measured", "not-measured", "not-accessible", "withdrawn"]),
        value: quantityOut.nullable(),
        typed: z.string().meta({ description: "The value exactly as it was typed." }),
        reason: z.string().nullable(),
        temperature: quantityOut.nullable(),
        gauge: z.string().nullable(),
        warnings: z.array(warning),
        superseded: z.boolean(),
        takenAt: z.string(),
      })
      .meta({ id: "Reading" }),
  ),
  handle: async ({ scope, params, query, say }) => {
    const build = await findBuild(scope, params.build);
    return pageOf(await listReadings(scope, build.id, query.stage), query, (row) => ({
      id: row.id,
      stage: row.stage,
      fit: row.fitId,
      position: row.position,
      feature: row.feature,
      plane: row.plane,
      axis: row.axis,
      repeat: row.repeat,
      state: row.state,
      value: row.valuePm === null ? null : say.length(metres(row.valuePm)),
      typed: row.typed,
      reason: row.reason,
      temperature: row.temperatureC === null ? null : say.temperature(row.temperatureC),
      gauge: row.gaugeId,
      warnings: JSON.parse(row.warningsJson) as z.infer<typeof warning>[],
      superseded: row.superseded,
      takenAt: row.takenAt,
    }));
  },
});
