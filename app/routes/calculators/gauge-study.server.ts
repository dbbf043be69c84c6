import { EngineeringError } from "~/engineering/engineering-error";
import { parseQuantity } from "~/engineering/quantity/parse";
import { gaugeStudy, type StudyResult } from "~/engineering/uncertainty/gauge-study";
import { AskedFields } from "./fields.server";

const most = 2000;

/** A gauge study by both methods from pasted lines: part, person, trial, value. */
export function calculateGaugeStudy(searched: URLSearchParams) {
  const asked = new AskedFields(searched);
  const page = { typed: asked.typed, errors: asked.errors };
  if (asked.isEmpty) return { ...page, result: undefined };
  const tolerance = asked.number("tolerance");
  const result = asked.result(
    () => {
      const study = gaugeStudy(readLines(asked.typed.readings ?? ""), tolerance);
      return {
        cautions: study.cautions,
        methods: [
          { name: "Average and range", ...shown(study.averageAndRange) },
          { name: "Analysis of variance", ...shown(study.anova) },
        ],
      };
    },
    (field) => (field === "tolerance" ? field : "readings"),
  );
  return { ...page, result };
}

function readLines(text: string) {
  const lines = text.split(/\r?\n/).filter((line) => line.trim() !== "");
  if (lines.length > most) {
    throw new EngineeringError("too-many-points", "readings", `A study has at most ${most} readings.`);
  }
  return lines.map((line, index) => {
    const cells = line.trim().split(/[\t;]+|,\s+|\s{2,}|\s+/);
    const [part, person, trial, ...value] = cells;
    if (!part || !person || !trial || value.length === 0) {
      throw new EngineeringError(
        "incomplete",
        "readings",
        `Line ${index + 1} needs four things: part, person, trial, value.`,
      );
    }
    return { part, person, trial, value: readValue(value.join(" "), index) };
  });
}

/** A plain number, or a length with its unit as millimetres. */
function readValue(text: string, index: number): number {
  if (/^[+-]?\d*[.,]?\d+$/.test(text)) return Number(text.replace(",", "."));
  try {
    return parseQuantity(text, "length").si * 1e3;
  } catch (error) {
    if (!(error instanceof EngineeringError)) throw error;
    throw new EngineeringError(error.code, "readings", `Line ${index + 1}: ${error.message}`);
  }
}

const names = {
  repeatability: "repeatability: same person, same part",
  reproducibility: "reproducibility: between people",
  gauge: "gauge: both together",
  partToPart: "part to part",
  total: "total",
} as const;

const verdicts = {
  good: "good: under 10 % of the study",
  conditional: "depends on what is at stake: 10 to 30 %",
  "not-good-enough": "not good enough: over 30 %",
} as const;

function shown(result: StudyResult) {
  return {
    verdict: verdicts[result.verdict],
    categories: result.distinctCategories === null ? "cannot be told" : String(result.distinctCategories),
    rows: (Object.keys(names) as (keyof typeof names)[]).map((key) => ({
      what: names[key],
      deviation: result[key].standardDeviation.toPrecision(5),
      ofStudy: `${result[key].percentOfStudy.toFixed(2)} %`,
      ofTolerance:
        result[key].percentOfTolerance === undefined ? "–" : `${result[key].percentOfTolerance.toFixed(1)} %`,
    })),
  };
}
