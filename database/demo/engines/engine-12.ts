import type { EngineSpec, FitSpec } from "../engine-spec";

const shells = {
  tolerance: "0.0003 in",
  limitsSource: "Shell maker's sheet, with the set",
  boreMaterial: "ductile-iron-80-55-06",
  journalMaterial: "steel-4340",
  boreFinish: "8 uin",
  journalFinish: "6 uin",
  coating: { kind: "dry-film", fromBuild: 6 },
} as const;

const pins = {
  nominal: "0.9270 in",
  tolerance: "0.0001 in",
  journalMaterial: "steel-4340",
  boreFinish: "10 uin",
  journalFinish: "2 uin",
  coating: { kind: "hard-carbon", fromBuild: 4 },
} as const;

const stems = {
  nominal: "0.3410 in",
  tolerance: "0.0002 in",
  limitsSource: "Valve maker's sheet",
  boreMaterial: "bearing-bronze-c93200",
  boreFinish: "16 uin",
  journalFinish: "8 uin",
} as const;

const fits: FitSpec[] = [
  {
    ...shells,
    kind: "main",
    nominal: "2.4500 in",
    length: "0.8400 in",
    usual: "0.0027 in",
    least: "0.0014 in",
    most: "0.0035 in",
  },
  {
    ...shells,
    kind: "big-end",
    boreMaterial: "steel-4340",
    nominal: "2.1000 in",
    length: "0.8500 in",
    usual: "0.0025 in",
    least: "0.0012 in",
    most: "0.0032 in",
  },
  {
    ...pins,
    kind: "pin-in-piston",
    length: "1.1000 in",
    usual: "0.0008 in",
    least: "0.0002 in",
    most: "0.0012 in",
    limitsSource: "Piston maker's sheet",
    boreMaterial: "aluminium-2618",
  },
  {
    ...pins,
    kind: "pin-in-rod",
    length: "1.0000 in",
    usual: "0.0008 in",
    least: "0.0003 in",
    most: "0.0013 in",
    limitsSource: "Rod maker's sheet",
    boreMaterial: "bearing-bronze-c93200",
  },
  {
    ...stems,
    kind: "intake-stem",
    length: "2.0000 in",
    usual: "0.0015 in",
    least: "0.0008 in",
    most: "0.0030 in",
    journalMaterial: "titanium-6al-4v",
  },
  {
    ...stems,
    kind: "exhaust-stem",
    length: "2.0000 in",
    usual: "0.0025 in",
    least: "0.0012 in",
    most: "0.0040 in",
    journalMaterial: "steel-4140",
  },
];

/** A clean-duty V8 whose big ends once went too far; coated since, and waiting for its crew chief. */
export const engine12: EngineSpec = {
  name: "Engine 12",
  form: "V",
  cylinders: 8,
  mains: 5,
  valvesPerCylinder: 2,
  bore: "4.1250 in",
  stroke: "3.3000 in",
  rodLength: "6.0000 in",
  revLimitRpm: 7600,
  duty: "Circuit, sprint races of 40 minutes",
  environment: "clean",
  running: "circuit",
  gauges: "inch",
  fits,
  builds: 9,
  endsAs: "torn-down",
  daysBetweenBuilds: 27,
  oils: [{ fromBuild: 1, oil: "Ostrel 20W-50" }],
  assigned: ["crew-chief", "viewer"],
  tooFar: {
    afterBuild: 3,
    fit: "big-end",
    slopesPast: 0.35,
    reason:
      "Three clean teardowns and a spare crank on the shelf: I want to know now where it stops, not at the end of the season.",
  },
};
