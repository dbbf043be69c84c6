import { inWords } from "../trade/condition";
import { chanceText, clearanceText, rateText, roughlyText, stepText, temperatureText } from "./lengths";
import type { Statement, Units } from "./types";

/** The values of a thing to say, each in the words of its kind. */
interface Values {
  text: (key: string) => string;
  number: (key: string, decimals?: number) => string;
  clearance: (key: string) => string;
  /** A clearance that is only believed: to a tenth, or to a micron. */
  roughly: (key: string) => string;
  step: (key: string) => string;
  rate: (key: string) => string;
  temperature: (key: string) => string;
  chance: (key: string) => string;
}

/** Every sentence of the next step, by its code. */
const sentences = {
  // Where to start.
  "start-at-usual": (v) =>
    `Nothing has run yet. Start at the shop's usual clearance of ${v.clearance("usual")}.`,
  "new-coating-first": (v) =>
    `A new coating starts at the usual clearance of ${v.clearance("usual")}; ${v.number("clean")} of ${v.number("runs")} clean runs there so far.`,

  // The data.
  "build-twice": (v) => `Two builds carry number ${v.number("build")}; put their order right before judging.`,
  "date-twice": (v) =>
    `Builds ${v.number("first")} and ${v.number("second")} carry the same date, ${v.text("date")}; put it right, so that it is clear what changed last.`,
  "not-torn-down": (v) =>
    `Build ${v.number("build")} has not been torn down; measure and grade its parts first.`,
  "another-engine": (v) =>
    `The readings of build ${v.number("build")} lie at ${v.clearance("clearance")}, its target was ${v.clearance("target")}: they look like another engine's. Check, and measure again.`,
  "copied-readings": (v) =>
    `All ${v.number("positions")} positions of build ${v.number("build")} read the same to the last digit, before and after: that is a copied column, not a measurement. Measure again.`,
  "temperature-unknown": (v) =>
    `Nobody noted how warm the parts of build ${v.number("build")} were. Measure again with parts and gauges at one known temperature.`,
  "negative-wear-everywhere": (v) =>
    `${v.number("positions")} positions of build ${v.number("build")} seem to have grown metal. Zero the gauges and measure again.`,
  "gauges-moved": (v) =>
    `On average the clearances of build ${v.number("build")} shrank by ${v.step("wear")}, more than the gauges can err: a zero has moved. Set the gauges and measure again.`,
  "too-few-positions": (v) =>
    `Only ${v.number("usable")} of ${v.number("expected")} positions of build ${v.number("build")} can be used. Measure the others, at assembly and at teardown.`,
  "not-graded": (v) =>
    `Only ${v.number("graded")} of ${v.number("positions")} positions of build ${v.number("build")} were graded. Grade the parts.`,
  spread: (v) =>
    `The clearances of build ${v.number("build")} spread over ${v.step("spread")}, more than a step of ${v.step("step")} could show. Measure again; if it stands, even the positions out before the next step.`,
  "uncertainty-over-step": (v) =>
    `Each clearance is good to ±${v.step("uncertainty")}, which cannot tell a step of ${v.step("step")}. Use a finer gauge or repeat the readings.`,
  "no-hours": (v) =>
    `Build ${v.number("build")} has no hours in its run log. Write them down; until then hold.`,
  "too-few-hours": (v) =>
    `Build ${v.number("build")} ran ${v.number("hours", 1)} h; under ${v.number("least", 1)} h nothing can be judged. Run it longer at the same clearance.`,
  "no-oil": (v) =>
    `No oil is written down for build ${v.number("build")}. A clearance is judged on its oil; enter it, until then hold.`,
  "oil-without-viscosity": (v) =>
    `${v.text("oil")} has no viscosity on file. Enter its viscosities at 40 and 100 °C; until then hold.`,

  // The cause.
  "damage-elsewhere": (v) =>
    `${v.number("position") === "0" ? "" : `Position ${v.number("position")}: `}${inWords(v.text("damage"))} does not come from the clearance. Look at ${v.text("look")}. Build ${v.number("build")} does not count as evidence; build again to the same target.`,
  "no-room-to-open": (v) =>
    `The fit cannot go wider than ${v.clearance("target")} within its limits, so clearance cannot be the answer. Find the cause.`,

  // Detriment.
  "grade-at-stop": (v) =>
    `Build ${v.number("build")} came down with grade ${v.number("grade")}${v.text("damage") ? ` (${inWords(v.text("damage"))})` : ""} on position ${v.text("positions")}; the shop stops at grade ${v.number("stop")}.`,
  "coating-worn-through": (v) =>
    `The coating of build ${v.number("build")} is worn through on position ${v.text("positions")}.`,
  "wear-rate-risen": (v) =>
    `Position by position, build ${v.number("build")} wore ${v.rate("rate")}, ${v.number("rise", 1)} times the engine's own ${v.rate("baseline")} at wider clearances; a paired test gives chance ${v.chance("p")}.`,
  "oil-hotter": (v) =>
    `The oil ran at ${v.temperature("nowC")} in build ${v.number("build")}, against ${v.temperature("beforeC")} at wider clearances.`,
  "open-to-known-good": (v) => `${v.clearance("target")} is the closest clearance that came down clean.`,
  "open-half-way": (v) =>
    `The damage is mild and the way back to ${v.clearance("good")} wide, so ${v.clearance("target")} lies between it and ${v.clearance("bad")}.`,
  "open-nothing-known-good": (v) =>
    `No wider clearance has run clean on this oil and coating yet; ${v.clearance("target")} is where the evidence points.`,

  // One thing at a time.
  "oil-changed": (v) =>
    `The oil changed in build ${v.number("build")} (${v.text("from")} to ${v.text("to")}), so the clearance holds for one more build: one thing at a time.`,
  "over-temperature": (v) =>
    `The oil went over its temperature in build ${v.number("build")}. Hold until it is known why.`,

  // The step.
  "limit-band": (v) =>
    `${v.text("share")} that the limit lies between ${v.roughly("from")} and ${v.roughly("to")}.`,
  "clean-builds": (v) =>
    `Builds that came down clean on this oil: ${v.number("count")}, the closest at ${v.clearance("closest")}.`,
  "full-step": (v) =>
    `The limit is far enough for a whole step of ${v.step("step")}; chance of grade 3 or worse ${v.chance("distress")}.`,
  "smaller-step": (v) =>
    `Close by ${v.step("step")}, less than the whole step of ${v.step("largest")}, because the limit comes nearer; chance of grade 3 or worse ${v.chance("distress")}.`,
  "larger-step-too-risky": (v) =>
    `${v.clearance("target")} would be too bold: chance of grade 3 or worse ${v.chance("distress")}, of failure ${v.chance("failure")}.`,
  "build-again-to-learn": () =>
    "One more build at this clearance tells more than a step would, for what a step risks.",
  "marked-near-limit": (v) =>
    `The positions are marked: the fit probably lies closer than is best. Open by ${v.step("step")}.`,
  "bracket-narrow": (v) =>
    `${v.clearance("good")} came down clean and ${v.clearance("bad")} did not; what lies between is less than can be measured and built (${v.step("least")} either way).`,
  "step-not-worth-it": (v) =>
    `Another step is expected to gain less than it costs, with failure weighed heavily: staying ${v.number("staying", 1)}, moving ${v.number("moving", 1)}, counted in rebuilds.`,
  "oil-next": (v) =>
    `This clearance has run clean ${v.number("runs")} times on ${v.text("oil")}. The next change, if any, may be one grade thinner oil at this same clearance; the limit then has to be found anew.`,

  // The margins.
  "hard-limit-least": (v) =>
    `${v.clearance("target")} would pass the least clearance allowed, ${v.clearance("least")}.`,
  "hard-limit-most": (v) =>
    `${v.clearance("target")} would pass the most clearance allowed, ${v.clearance("most")}.`,
  "closes-hot": (v) => `Hot, ${v.clearance("target")} would leave only ${v.clearance("tightest")}.`,
  "closes-cold": (v) =>
    `At a cold start, ${v.clearance("target")} would leave only ${v.clearance("tightest")}.`,
  "near-known-bad": (v) =>
    `${v.clearance("target")} is too near ${v.clearance("knownBad")}, which came down distressed.`,
  "film-too-thin": (v) =>
    `At ${v.clearance("target")} the film is predicted at ${v.number("lambda", 1)} times the roughness; the floor is ${v.number("floor", 1)}.`,

  // Cautions.
  "typing-slip": (v) =>
    `Position ${v.number("position")} of build ${v.number("build")} reads ${v.clearance("value")} at ${v.text("stage")}${v.text("likely") ? `, ${v.text("likely")}` : ", far from the others"}. It was left out; check the entry.`,
  "negative-wear": (v) =>
    `Position ${v.number("position")} of build ${v.number("build")} seems to have closed by ${v.step("value")}, more than the gauges can err: a measuring slip. It was left out.`,
  interference: (v) =>
    `Position ${v.number("position")} of build ${v.number("build")} has no clearance at ${v.text("stage")} (${v.clearance("value")}); check whether bore and journal were swapped. It was left out.`,
  "odd-position": (v) =>
    `Position ${v.text("positions")} of build ${v.number("build")} wore unlike the others. Look at what is different there.`,
  "missing-positions": (v) =>
    `${v.number("missing")} of ${v.number("expected")} positions of build ${v.number("build")} were not fully measured; the others had to do.`,
  "uncertainty-assumed": (v) =>
    `No uncertainty was given; ±${v.step("uncertainty")} was taken for each clearance.`,
  "elsewhere-too": (v) =>
    `Position ${v.number("position")} also shows ${inWords(v.text("damage"))}, which does not come from the clearance. Look at ${v.text("look")}.`,
  "not-this-clearance-again": (v) =>
    `Do not run ${v.clearance("target")} again before the cause of the damage is known.`,
  "event-seen": (v) => `Build ${v.number("build")} had: ${v.text("events")}. That may show in its parts.`,
  "poor-data-too": (v) => `${v.text("because")} The grades alone opened the fit.`,
  "oil-changed-too": (v) =>
    `The oil changed in build ${v.number("build")} as well. Going back to ${v.text("from")} at this clearance is the other way; not both at once.`,
  "unlike-evidence": (v) =>
    `Builds that count less or not at all: ${v.number("count")} of ${v.number("of")} (other oil or coating, debris, poor readings, or old).`,
  "little-evidence": (v) =>
    `Builds that count in full: ${v.number("count")}; the answer leans on what is usual.`,
} as const satisfies Record<string, (values: Values) => string>;

export type Code = keyof typeof sentences;

/** A thing to say, before it is put into words: its code and its numbers, SI. */
export interface Said {
  code: Code;
  values: Record<string, number | string>;
}

/** Puts a thing into words; lengths in the units asked for. */
export function inSentence({ code, values }: Said, units: Units): Statement {
  const numeric = (key: string) => Number(values[key] ?? 0);
  const text = sentences[code]({
    text: (key) => String(values[key] ?? ""),
    number: (key, decimals = 0) => numeric(key).toFixed(decimals),
    clearance: (key) => clearanceText(numeric(key), units),
    roughly: (key) => roughlyText(numeric(key), units),
    step: (key) => stepText(numeric(key), units),
    rate: (key) => rateText(numeric(key), units),
    temperature: (key) => temperatureText(numeric(key), units),
    chance: (key) => chanceText(numeric(key)),
  });
  return { code, text, values };
}

/** A stored statement's sentence in other units; as it was stored where its code is no longer one of ours. */
export function inUnits(statement: Statement, units: Units): string {
  return isCode(statement.code)
    ? inSentence({ ...statement, code: statement.code }, units).text
    : statement.text;
}

const isCode = (code: string): code is Code => Object.hasOwn(sentences, code);
