import { z } from "zod";
import { readBoxKey } from "~/components/sheet/boxes";
import type { SheetAnswer } from "~/components/sheet/use-sender";
import { diameterUnitName, type PageUnits } from "~/engineering/quantity/figures";
import { type Build, listTargets } from "~/models/build.server";
import { findFit } from "~/models/fit.server";
import { listGauges } from "~/models/gauge.server";
import type { Box } from "~/models/reading.server";
import { invalid } from "~/models/refusal";
import type { Scope } from "~/models/scope";
import { recordEntry } from "~/models/sheet-entry.server";
import { optionalQuantity } from "~/routes/form-fields";

const entry = z.object({
  key: z.string().max(80),
  typed: z.string().max(200),
  supersedes: z.string().max(40).nullable(),
});

const session = z.object({
  fit: z.string(),
  temperature: optionalQuantity("temperature", "degC").refine(
    (value) => value === undefined || (value.si >= -40 && value.si <= 200),
    "Parts are measured between −40 and 200 °C; look at the value and its unit.",
  ),
  boreGauge: z.string().default(""),
  journalGauge: z.string().default(""),
});

/**
 * Saves boxes of a sheet, each by itself: what is wrong with one keeps no other from being saved.
 * The same for a batch that script sends as it is typed and for the whole form that a page without script sends.
 */
export async function saveBoxes(
  scope: Scope,
  units: PageUnits,
  build: Build,
  stage: Box["stage"],
  form: FormData,
): Promise<SheetAnswer> {
  const typed = session.safeParse(Object.fromEntries(form));
  if (!typed.success) {
    const issue = typed.error.issues[0]!;
    throw invalid({ path: issue.path.join("."), code: issue.code, message: issue.message });
  }
  const [fit, targets, gauges] = await Promise.all([
    findFit(scope, build.engine_id, typed.data.fit),
    listTargets(scope, build.id),
    listGauges(scope),
  ]);
  const aim = targets.find((target) => target.fitId === fit.id)?.aim_pm ?? fit.usual_pm;
  const known = (id: string) => (gauges.some((gauge) => gauge.id === id) ? id : undefined);
  const gaugeOf = { bore: known(typed.data.boreGauge), journal: known(typed.data.journalGauge) };

  const results: NonNullable<SheetAnswer["results"]> = [];
  for (const { key, typed: text, supersedes } of entriesOf(form)) {
    const box = readBoxKey(key);
    if (!box) continue;
    const result = await recordEntry(
      scope,
      build,
      fit,
      {
        box: { stage, fitId: fit.id, positionId: box.positionId, ...box.station, repeat: 1 },
        typed: text,
        defaultUnit: diameterUnitName(units),
        temperatureC: typed.data.temperature?.si,
        gaugeId: gaugeOf[box.station.feature],
        supersedes,
      },
      aim,
    );
    results.push({
      key,
      readingId: result.readingId,
      ...(result.status === "refused" ? { refused: { typed: text, error: result.message } } : {}),
    });
  }
  return { results };
}

function entriesOf(form: FormData): z.infer<typeof entry>[] {
  const sent = form.get("entries");
  if (typeof sent === "string") {
    const parsed = z.array(entry).max(500).safeParse(safeJson(sent));
    if (!parsed.success)
      throw invalid({ path: "entries", code: "unreadable", message: "The boxes could not be read." });
    return parsed.data;
  }
  // Without script every box comes along; those that still say what they said when the page was made are left alone.
  const entries: z.infer<typeof entry>[] = [];
  for (const [key, value] of form.entries()) {
    if (typeof value !== "string" || !readBoxKey(key)) continue;
    const was = String(form.get(`was.${key}`) ?? "");
    if (value.trim() === was) continue;
    entries.push({ key, typed: value, supersedes: String(form.get(`id.${key}`) ?? "") || null });
  }
  return entries;
}

function safeJson(text: string): unknown {
  try {
    return JSON.parse(text);
  } catch {
    return undefined;
  }
}
