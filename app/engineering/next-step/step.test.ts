import { expect, test } from "vitest";
import {
  bigEndHistory,
  bigEnds,
  build,
  oil,
  tenth,
  thou,
  usual,
  withPosition,
} from "#test/support/big-end-history";
import { nextStep } from "./next-step";

const closer = usual - 2 * tenth;

// The order of judgement and what each guard answers (next-step.md; common practice of careful builders, no source).

test("closing a big end after two clean teardowns: by no more than two tenths, no less than can be measured", () => {
  const { action, subject, step, target, confidence, reasons } = nextStep(
    bigEndHistory(build(1, usual), build(2, usual)),
  );
  expect(action).toBe("close");
  expect(subject).toBe("clearance");
  expect(step).toBeGreaterThanOrEqual(-2 * tenth - 1e-12);
  expect(step).toBeLessThanOrEqual(-0.6 * tenth);
  expect(target).toBeCloseTo(usual + step, 12);
  expect(confidence).toBeGreaterThan(0.9);
  expect(reasons.map(({ code }) => code)).toEqual(expect.arrayContaining(["limit-band", "clean-builds"]));
});

test("a step is never less than the uncertainty of a clearance, however rough the gauges", () => {
  for (const uncertainty of [0.3, 0.9, 1.3, 1.7]) {
    const rough = build(1, usual, {
      positions: bigEnds(usual).map((position) => ({ ...position, uncertainty: uncertainty * tenth })),
    });
    const { action, step } = nextStep(bigEndHistory(rough));
    if (action === "close") expect(-step).toBeGreaterThanOrEqual(uncertainty * tenth - 1e-12);
    else expect(step).toBe(0);
  }
});

test("marks on several positions make the next step smaller or none", () => {
  const clean = nextStep(bigEndHistory(build(1, usual), build(2, closer)));
  const marked = nextStep(
    bigEndHistory(
      build(1, usual),
      build(2, closer, {
        positions: bigEnds(closer).map((position, index) => ({ ...position, grade: index < 3 ? 2 : 1 })),
      }),
    ),
  );
  expect(clean.step).toBeLessThan(0);
  expect(marked.step).toBeGreaterThan(clean.step);
});

test("debris on one position: find the cause, build again to the same target, and count the build for nothing", () => {
  const dirty = build(2, closer, {
    events: ["debris"],
    positions: withPosition(bigEnds(closer), 3, { grade: 3, damage: "embedded-particles" }),
  });
  const answer = nextStep(bigEndHistory(build(1, usual), dirty));
  expect(answer).toMatchObject({ action: "find-cause", step: 0, target: closer, confidence: 0 });
  expect(answer.reasons[0]!.text).toContain("Position 3");
  expect(answer.evidence.builds[1]).toMatchObject({ weight: 0, why: "damage-elsewhere" });
  const before = nextStep(bigEndHistory(build(1, usual))).evidence.posterior;
  expect(answer.evidence.posterior).toEqual(before);
});

test.each(["corrosion", "edge-loading", "misalignment", "detonation-marks", "starvation", "scoring"])(
  "%s on one position is not the clearance's doing",
  (damage) => {
    const positions = withPosition(bigEnds(closer), 5, { grade: 3, damage });
    expect(nextStep(bigEndHistory(build(1, usual), build(2, closer, { positions }))).action).toBe(
      "find-cause",
    );
  },
);

test("a shell that failed in an over-rev says nothing about the clearance, and is not run again unexplained", () => {
  const positions = withPosition(bigEnds(closer), 2, { grade: 4, damage: "wiping" });
  const answer = nextStep(
    bigEndHistory(build(1, usual), build(2, closer, { events: ["over-rev"], positions })),
  );
  expect(answer.action).toBe("find-cause");
  expect(answer.cautions.map(({ code }) => code)).toContain("not-this-clearance-again");
});

test.each(["wiping", "wear-by-friction", "overheating", null])(
  "grade 3 from %s opens the fit to the last clearance known good or half-way there",
  (damage) => {
    const tight = usual - 4 * tenth;
    const answer = nextStep(
      bigEndHistory(
        build(1, usual),
        build(2, tight, { positions: withPosition(bigEnds(tight), 4, { grade: 3, damage }) }),
      ),
    );
    expect(answer.action).toBe("open");
    expect(answer.target).toBeGreaterThanOrEqual((usual + tight) / 2 - 1e-12);
    expect(answer.target).toBeLessThanOrEqual(usual + 1e-12);
    expect(answer.reasons[0]!.code).toBe("grade-at-stop");
    expect(answer.evidence).toMatchObject({ knownGood: usual, knownBad: tight });
  },
);

test("a failed shell and a coating worn through open all the way back to what was good", () => {
  const failed = bigEnds(closer, { grade: 4, damage: "wiping" });
  expect(nextStep(bigEndHistory(build(1, usual), build(2, closer, { positions: failed }))).target).toBe(
    usual,
  );
  const through = withPosition(bigEnds(closer), 1, { coatingState: "worn-through" });
  expect(nextStep(bigEndHistory(build(1, usual), build(2, closer, { positions: through })))).toMatchObject({
    action: "open",
    target: usual,
  });
});

test("distress in the first build opens past the usual clearance; with no room left it asks for the cause", () => {
  const history = bigEndHistory(build(1, usual, { positions: bigEnds(usual, { grade: 3 }) }));
  const answer = nextStep(history);
  expect(answer.action).toBe("open");
  expect(answer.target).toBeGreaterThan(usual);
  history.fit.hardLimits = { least: thou, most: usual };
  expect(nextStep(history)).toMatchObject({ action: "find-cause", step: 0 });
});

test("wear three times the engine's own, position by position, opens a fit that still looks good", () => {
  const answer = nextStep(
    bigEndHistory(
      build(1, usual, { positions: bigEnds(usual, { wear: 0.4 }) }),
      build(2, usual, { positions: bigEnds(usual, { wear: 0.4 }) }),
      build(3, closer, { positions: bigEnds(closer, { wear: 1.4 }) }),
    ),
  );
  expect(answer.action).toBe("open");
  expect(answer.reasons[0]).toMatchObject({ code: "wear-rate-risen" });
  expect(answer.reasons[0]!.values.rise).toBeCloseTo(3.5, 6);
});

test("oil fifteen degrees hotter at like duty opens a fit that was closed", () => {
  const hot = build(4, closer, { oil: { ...oil, temperatureC: 120 } });
  const answer = nextStep(bigEndHistory(build(1, usual), build(2, usual), build(3, usual), hot));
  expect(answer.action).toBe("open");
  expect(answer.reasons[0]!.code).toBe("oil-hotter");
});

test("no step passes a hard limit, a clearance known bad, a film too thin, or the metal itself when hot", () => {
  const clean = bigEndHistory(build(1, usual), build(2, usual));
  const proposed = nextStep(clean).target;
  const least = usual - tenth;
  const limited = nextStep({ ...clean, fit: { ...clean.fit, hardLimits: { least, most: 3.2 * thou } } });
  expect(proposed).toBeLessThan(least);
  expect(limited.target).toBeGreaterThanOrEqual(least - 1e-12);

  const film = [
    { clearance: 2.0 * thou, lambda: 0.4 },
    { clearance: usual, lambda: 1.4 },
  ];
  const filmed = nextStep({ ...clean, film }, { lambdaFloor: 1.2 });
  expect(filmed.target).toBeGreaterThanOrEqual(usual - tenth - 1e-12);

  const closesHot = { ...clean.fit, temperatureChange: { hot: -2.4 * thou, cold: 0 } };
  expect(nextStep({ ...clean, fit: closesHot }).target - 2.4 * thou).toBeGreaterThan(0);

  const bad = usual - 3 * tenth;
  const bracketed = nextStep(
    bigEndHistory(build(1, usual), build(2, bad, { positions: bigEnds(bad, { grade: 3 }) }), build(3, usual)),
  );
  expect(bracketed.target).toBeGreaterThanOrEqual(bad + 0.6 * tenth - 1e-12);
});

test("a new coating starts at the usual clearance and stays for its baseline runs", () => {
  const history = bigEndHistory(build(1, usual));
  history.fit.coating = { kind: "dry-film", isNew: true };
  expect(nextStep(history, { usual, baselineRuns: 2 })).toMatchObject({ action: "hold", target: usual });
  expect(nextStep(history, { usual, baselineRuns: 1 }).action).toBe("close");

  const recoated = bigEndHistory(
    build(1, usual, { coating: null }),
    build(2, closer, { coating: null }),
    build(3, closer - tenth, { coating: null }),
  );
  recoated.fit.coating = { kind: "dry-film", isNew: false };
  expect(nextStep(recoated, { usual })).toMatchObject({ action: "open", target: usual });
});

test("bedding-in of a new coating is not held against its clearance", () => {
  const first = build(1, usual, { positions: bigEnds(usual, { wear: 1.6 }) });
  const history = bigEndHistory(first, build(2, usual));
  history.fit.coating = { kind: "dry-film", isNew: true };
  const { action, evidence } = nextStep(history, { usual });
  expect(action).toBe("close");
  expect(evidence.baselineRate).toBeCloseTo((0.15 * tenth) / 6.5, 12);
});

test("one thing at a time: after a change of oil the clearance holds, unless the rules let both move", () => {
  const thin = { name: "B", grade: "40", kv40: 90, kv100: 13.8, temperatureC: 104 };
  const history = bigEndHistory(build(1, usual), build(2, usual, { oil: thin }));
  const held = nextStep(history);
  expect(held).toMatchObject({ action: "hold", step: 0 });
  expect(held.reasons[0]!.code).toBe("oil-changed");
  expect(held.evidence.builds[0]).toMatchObject({ weight: 0.25, why: "other-oil" });
  expect(nextStep(history, { moveOilAndClearance: true }).action).toBe("close");
});

test("grade 3 right after a change of oil opens the clearance and says that the oil is the other way", () => {
  const thin = { name: "B", grade: "40", kv40: 90, kv100: 13.8, temperatureC: 104 };
  const worn = build(3, closer, { oil: thin, positions: bigEnds(closer, { grade: 3 }) });
  const answer = nextStep(bigEndHistory(build(1, usual), build(2, closer), worn));
  expect(answer.action).toBe("open");
  expect(answer.cautions.map(({ code }) => code)).toContain("oil-changed-too");
});

test("a bracket narrower than can be measured is settled; run clean once more, the oil may be next", () => {
  const bad = usual - 3 * tenth;
  const good = usual - 2.2 * tenth;
  const tried = [
    build(1, usual),
    build(2, bad, { positions: withPosition(bigEnds(bad), 2, { grade: 3 }) }),
    build(3, good),
  ];
  const once = nextStep(bigEndHistory(...tried));
  expect(once).toMatchObject({ action: "settled", subject: "clearance", step: 0, target: good });
  const twice = nextStep(bigEndHistory(...tried, build(4, good)));
  expect(twice).toMatchObject({ action: "settled", subject: "oil", step: 0, target: good });
  expect(twice.reasons.map(({ code }) => code)).toContain("oil-next");
});
