import { clearanceText, stepText } from "./lengths";
import type { CompleteRules } from "./rules";
import type { NextStep, Units } from "./types";

type Answer = Pick<NextStep, "action" | "step" | "target" | "subject">;

/** What would change the answer, as sentences. */
export function wouldChange(
  { action, step, target, subject }: Answer,
  rules: CompleteRules,
  units: Units,
): string[] {
  const at = clearanceText(target, units);
  const stop = `A position at grade ${rules.stopGrade} or worse from wiping, friction or heat would open the fit.`;
  switch (action) {
    case "close":
      return [
        "One more marked position, or more wear than before, would make the step smaller or hold it.",
        stop,
        `A clean teardown at ${at} would bring the next step nearer to the limit.`,
      ];
    case "open":
      return [
        "A cause other than the clearance, once found and named in the findings, would take this build out of the evidence.",
        `A clean teardown at ${at} would settle the fit near it.`,
      ];
    case "hold":
      return ["What is named above, put right, would let the fit be judged anew.", stop];
    case "settled":
      return [
        stop,
        subject === "oil"
          ? "A thinner oil would open the question again, one grade at a time, with the clearance held."
          : "Another oil, coating or duty would open the question again.",
      ];
    case "measure-again":
      return [
        "Readings that stand up to a second measurement would let the fit be judged.",
        ...(step === 0 ? [`Until then ${at} stays the target.`] : []),
      ];
    case "find-cause":
      return [
        "The cause found and put right, and one more build at the same target, would let the clearance be judged.",
        `Damage that proves to come from the clearance would open the fit by up to ${stepText(2 * rules.largestStep, units)}.`,
      ];
  }
}

/** What the program cannot see, whatever it proposes. */
export const cannotSee: readonly string[] = [
  "The parts themselves: cracks, a bent rod, a blocked oil way, a cap on the wrong way round.",
  "How hard the next run will be, and how well the oil is fed in corners, on banks and under braking.",
  "Whether the gauges were set right, when all of them erred together.",
  "The parts makers' limits and the rules of the event: they stand above this proposal, and a qualified builder decides.",
];
