import { z } from "zod";
import { metres } from "~/engineering/quantity/length";
import type { Fit } from "~/models/fit.server";
import { quantityOut, type Say } from "../frame/quantity-out";
import { stored } from "./answers";

/** A fit of an engine as the API gives it. */
export const fitAnswer = z
  .object({
    ...stored,
    kind: z.string(),
    positions: z.array(z.int()),
    nominal: quantityOut,
    length: quantityOut.nullable(),
    usual: quantityOut,
    hardLimits: z.object({ least: quantityOut, most: quantityOut }),
    limitsSource: z.string(),
    coating: z.string().nullable(),
  })
  .meta({ id: "Fit" });

export function sayFit(row: Fit, say: Say): z.input<typeof fitAnswer> {
  return {
    id: row.id,
    version: row.version,
    kind: row.kind,
    positions: row.positions.map(({ number }) => number),
    nominal: say.length(metres(row.nominal_pm)),
    length: row.length_pm === null ? null : say.length(metres(row.length_pm)),
    usual: say.clearance(metres(row.usual_pm)),
    hardLimits: { least: say.clearance(metres(row.least_pm)), most: say.clearance(metres(row.most_pm)) },
    limitsSource: row.limits_source,
    coating: row.coating,
  };
}
