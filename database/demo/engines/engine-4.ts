import type { EngineSpec, FitSpec } from "../engine-spec";

const shells = {
  tolerance: "0.0003 in",
  limitsSource: "Shell maker's sheet, with the set",
  journalMaterial: "steel-4340",
  boreFinish: "10 uin",
  journalFinish: "8 uin",
} as const;

// Chromium nitride stands dust better than thin hard carbon (common practice, no source).
const pins = {
  nominal: "0.8660 in",
  tolerance: "0.0001 in",
  journalMaterial: "steel-4340",
  boreFinish: "10 uin",
  journalFinish: "2 uin",
  coating: { kind: "chromium-nitride", fromBuild: 5 },
} as const;

const stems = {
  nominal: "0.2360 in",
  tolerance: "0.0002 in",
  limitsSource: "Valve maker's sheet",
  boreMaterial: "bearing-bronze-c93200",
  journalMaterial: "steel-4140",
  boreFinish: "16 uin",
  journalFinish: "8 uin",
} as const;

const fits: FitSpec[] = [
  {
    ...shells,
    kind: "main",
    boreMaterial: "gray-iron",
    nominal: "2.3600 in",
    length: "0.7600 in",
    usual: "0.0026 in",
    least: "0.0013 in",
    most: "0.0034 in",
  },
  {
    ...shells,
    kind: "big-end",
    boreMaterial: "steel-4340",
    nominal: "2.0470 in",
    length: "0.7900 in",
    usual: "0.0024 in",
    least: "0.0012 in",
    most: "0.0032 in",
  },
  {
    ...pins,
    kind: "pin-in-piston",
    length: "0.9500 in",
    usual: "0.0008 in",
    least: "0.0002 in",
    most: "0.0012 in",
    limitsSource: "Piston maker's sheet",
    boreMaterial: "aluminium-4032",
  },
  {
    ...pins,
    kind: "pin-in-rod",
    length: "0.9000 in",
    usual: "0.0008 in",
    least: "0.0003 in",
    most: "0.0013 in",
    limitsSource: "Rod maker's sheet",
    boreMaterial: "bearing-bronze-c93200",
  },
  {
    ...stems,
    kind: "intake-stem",
    length: "1.6000 in",
    usual: "0.0015 in",
    least: "0.0008 in",
    most: "0.0030 in",
  },
  {
    ...stems,
    kind: "exhaust-stem",
    length: "1.6000 in",
    usual: "0.0025 in",
    least: "0.0012 in",
    most: "0.0040 in",
  },
];

/** A dusty-duty four that once swallowed grit; its eighth build is being measured. */
export const engine4: EngineSpec = {
  name: "Engine 4",
  form: "inline",
  cylinders: 4,
  mains: 5,
  valvesPerCylinder: 4,
  bore: "3.3860 in",
  stroke: "3.3860 in",
  rodLength: "5.7000 in",
  revLimitRpm: 8200,
  duty: "Desert stages, four to six hours on a filter",
  environment: "dusty",
  running: "stages",
  gauges: "inch",
  fits,
  builds: 8,
  endsAs: "measuring",
  daysBetweenBuilds: 31,
  oils: [{ fromBuild: 1, oil: "Ostrel 20W-50" }],
  assigned: ["crew-chief"],
  dirt: { build: 3, fit: "big-end", position: 3 },
};
