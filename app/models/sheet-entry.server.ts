import { EngineeringError } from "~/engineering/engineering-error";
import { checkSlip } from "~/engineering/quantity/slip";
import type { UnitName } from "~/engineering/quantity/units";
import { readBoxText } from "~/engineering/trade/box-text";
import { slipExpectation } from "~/engineering/trade/slip-expectation";
import type { Build } from "./build.server";
import type { Fit } from "./fit.server";
import { type Box, insertReading, type NewReading, type ReadingWarning } from "./reading.server";
import { Refusal } from "./refusal";
import type { Scope } from "./scope";

/** One box as it was typed, with the unit that a bare number has on the page it was typed on. */
export interface SheetEntry {
  box: Box;
  typed: string;
  defaultUnit: UnitName;
  temperatureC?: number | undefined;
  gaugeId?: string | undefined;
  supersedes?: string | null | undefined;
}

/** What became of an entry: on disk, or refused with a sentence for the box. */
export type EntryResult =
  | { status: "accepted"; readingId: string | null; warnings: ReadingWarning[] }
  | { status: "refused"; readingId: string | null; code: string; message: string };

/** Writes one box down. A slip is warned of and kept with the reading; what cannot be read is refused. */
export async function recordEntry(
  scope: Scope,
  build: Build,
  fit: Fit,
  entry: SheetEntry,
  targetAimPm: number,
): Promise<EntryResult> {
  const refused = (code: string, message: string): EntryResult => ({
    status: "refused",
    readingId: entry.supersedes ?? null,
    code,
    message,
  });
  try {
    const reading = readEntry(fit, entry, targetAimPm);
    if (reading.state === "withdrawn" && !entry.supersedes) {
      return { status: "accepted", readingId: null, warnings: [] };
    }
    const readingId = await insertReading(scope, build, reading);
    return { status: "accepted", readingId, warnings: reading.warnings };
  } catch (error) {
    if (error instanceof EngineeringError || error instanceof Refusal)
      return refused(error.code, error.message);
    throw error;
  }
}

function readEntry(fit: Fit, entry: SheetEntry, targetAimPm: number): NewReading {
  const content = readBoxText(entry.typed, entry.defaultUnit, fit.nominal_pm);
  const { box, temperatureC, gaugeId, supersedes } = entry;
  const common = { box, temperatureC, gaugeId, supersedes, warnings: [] as ReadingWarning[] };
  if (content.state === "blank") return { ...common, state: "withdrawn" };
  if (content.state !== "measured") return { ...common, state: content.state, reason: content.reason };
  const slip = checkSlip(
    content.value.picometres as number,
    slipExpectation(fit.nominal_pm, targetAimPm, box.feature),
  );
  const warnings = slip ? [{ code: slip.code, message: slip.message }] : [];
  return { ...common, state: "measured", value: content.value, warnings };
}
