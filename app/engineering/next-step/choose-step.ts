import { chancesOfBest } from "./likely-limit";
import { lookAhead, type Outlook, type Prospect } from "./look-ahead";
import { type Margins, marginAt } from "./margin";
import type { Belief } from "./posterior";
import { tenth } from "./rules";
import type { Situation } from "./situation";
import type { Action, History } from "./types";
import type { Said } from "./words";

const micron = 1e-6;

/** Steps are chosen in half tenths: finer than that nobody builds. */
const stepGrid = tenth / 2;

/** Below this chance that the best clearance is wider, nobody opens a fit that came down clean. */
const worthOpening = 0.25;

/** No closing is proposed that is likelier than these to bring grade 3 or worse, or grade 4. */
export const riskCaps = { distress: 0.2, failure: 0.015 } as const;

export interface Chosen {
  action: Extract<Action, "close" | "hold" | "open" | "settled">;
  target: number;
  reasons: Said[];
  considered: Prospect[];
}

/** All that a step is chosen from. Lengths in m, but for the belief and the situation, which are in µm. */
export interface Choosing {
  history: History;
  belief: Belief;
  situation: Situation;
  margins: Margins;
  /** The target of the last build. */
  current: number;
  /** Whether the last build came down marked in several positions: then no full step. */
  marked: boolean;
  /** Whether the last build counts and came down clean, so that staying is an answer. */
  mayStay: boolean;
}

/** The fifth guard: the step of least expected cost that every limit allows. */
export function chooseStep(choosing: Choosing): Chosen {
  const { current, margins, marked, situation } = choosing;
  const { leastStep, rules } = margins;
  const largest = Math.max(leastStep, marked ? rules.largestStep / 2 : rules.largestStep);
  const closing = stepsBetween(leastStep, largest).map((step) => current - step);
  const staysPut = marginAt(current, choosing.history, margins) === null;
  const { wider } = chancesOfBest(choosing.belief, situation, situation.current);
  const opening =
    wider > worthOpening || !staysPut
      ? stepsBetween(leastStep, rules.largestStep).map((step) => current + step)
      : [];
  const { allowed, refused } = sortByMargin(
    [...closing, current, ...opening, ...backInside(choosing)],
    choosing,
  );
  if (allowed.length === 0) {
    return { action: "hold", target: current, reasons: refused.slice(0, 1), considered: [] };
  }
  const outlook = outlookOf(allowed, choosing);
  const daring = outlook.prospects.filter((prospect) => isTooRisky(prospect, situation));
  const prudent = outlook.prospects.filter((prospect) => !isTooRisky(prospect, situation));
  const best = cheapest(prudent);
  if (
    staysPut &&
    choosing.mayStay &&
    (best === undefined || outlook.settled <= best.expectedCost || isNarrow(choosing, best))
  ) {
    return {
      action: "settled",
      target: current,
      reasons: whySettled(choosing, best, outlook),
      considered: outlook.prospects,
    };
  }
  if (best === undefined) {
    return { action: "hold", target: current, reasons: refused.slice(0, 1), considered: outlook.prospects };
  }
  const target = toPicometre(best.target * micron);
  const action = Math.abs(target - current) < 1e-9 ? "hold" : target < current ? "close" : "open";
  const limited = refused[0] ?? (daring.length > 0 ? tooRisky(daring) : null);
  return {
    action,
    target,
    reasons: [
      ...whyStep(action, best, target - current, margins),
      ...(limited && action !== "open" ? [limited] : []),
    ],
    considered: outlook.prospects,
  };
}

/** The target of least expected cost among those given that the margins allow; null where they allow none. */
export function cheapestTarget(targets: readonly number[], choosing: Choosing) {
  const { allowed } = sortByMargin(targets, choosing);
  if (allowed.length === 0) return null;
  const { prospects } = outlookOf(allowed, choosing);
  return { target: toPicometre(cheapest(prospects)!.target * micron), considered: prospects };
}

/**
 * From the least to the largest in half tenths, the largest itself always; empty where the least is larger. Where rough
 * gauges make the least step more than a tenth, that step itself too, rounded up to a tenth of a tenth.
 */
export function stepsBetween(least: number, largest: number): number[] {
  if (least > largest + 1e-12) return [];
  const inGrid = (grid: number) => Math.ceil(least / grid - 1e-6) * grid;
  const steps = new Set([largest]);
  if (least > tenth && inGrid(tenth / 10) < largest - 1e-9) steps.add(inGrid(tenth / 10));
  for (let step = inGrid(stepGrid); step < largest - 1e-9; step += stepGrid) steps.add(step);
  return [...steps].sort((a, b) => a - b);
}

/** Where the last build lies outside the hard limits, the limit itself is a target too. */
function backInside({ history, current, margins }: Choosing): number[] {
  const { least, most } = history.fit.hardLimits ?? { least: 0, most: Number.POSITIVE_INFINITY };
  if (current < least) return [least];
  return current > most ? [Math.max(most, current - margins.rules.largestStep)] : [];
}

function sortByMargin(targets: readonly number[], { history, margins }: Choosing) {
  const allowed: number[] = [];
  const refused: Said[] = [];
  for (const target of targets.map(toPicometre)) {
    const why = target > 0 ? marginAt(target, history, margins) : null;
    if (why) refused.push(why);
    else if (target > 0) allowed.push(target);
  }
  return { allowed, refused };
}

function outlookOf(targets: readonly number[], { belief, situation }: Choosing): Outlook {
  return lookAhead(
    belief,
    situation,
    targets.map((target) => target / micron),
  );
}

function isTooRisky({ target, distress, failure }: Prospect, { current }: Situation): boolean {
  return target < current - 1e-3 && (distress > riskCaps.distress || failure > riskCaps.failure);
}

function cheapest(prospects: readonly Prospect[]): Prospect | undefined {
  return prospects.reduce<Prospect | undefined>(
    (best, prospect) => (best === undefined || prospect.expectedCost < best.expectedCost ? prospect : best),
    undefined,
  );
}

/** A bracket narrower than what can be measured leaves nothing to find by closing or repeating. */
function isNarrow({ margins, current, situation }: Choosing, best: Prospect): boolean {
  const { knownBad } = margins.bracket;
  const opens = best.target > situation.current + 1e-3;
  return knownBad !== null && !opens && current - knownBad < 2 * margins.leastStep - 1e-9;
}

function whySettled(
  { margins, current }: Choosing,
  best: Prospect | undefined,
  { settled }: Outlook,
): Said[] {
  const { knownBad } = margins.bracket;
  if (knownBad !== null && current - knownBad < 2 * margins.leastStep - 1e-9) {
    return [{ code: "bracket-narrow", values: { good: current, bad: knownBad, least: margins.leastStep } }];
  }
  return [{ code: "step-not-worth-it", values: { staying: settled, moving: best?.expectedCost ?? settled } }];
}

function whyStep(
  action: Chosen["action"],
  best: Prospect,
  step: number,
  { rules, leastStep }: Margins,
): Said[] {
  const { distress } = best;
  if (action === "hold") return [{ code: "build-again-to-learn", values: {} }];
  if (action === "open") return [{ code: "marked-near-limit", values: { step } }];
  const full = Math.abs(-step - rules.largestStep) < 1e-9;
  return [
    full
      ? { code: "full-step", values: { step: -step, distress } }
      : {
          code: "smaller-step",
          values: { step: -step, distress, largest: rules.largestStep, least: leastStep },
        },
  ];
}

function tooRisky(daring: readonly Prospect[]): Said {
  const { target, distress, failure } = daring.reduce((a, b) => (a.target > b.target ? a : b));
  return { code: "larger-step-too-risky", values: { target: target * micron, distress, failure } };
}

function toPicometre(length: number): number {
  return Math.round(length * 1e12) / 1e12;
}
