import type { EngineSpec, FitSpec } from "../engine-spec";

const shells = {
  tolerance: "0.008 mm",
  limitsSource: "Shell maker's sheet, with the set",
  journalMaterial: "steel-4340",
  boreFinish: "0.2 um",
  journalFinish: "0.15 um",
} as const;

const pins = {
  nominal: "22.000 mm",
  tolerance: "0.003 mm",
  journalMaterial: "steel-4340",
  boreFinish: "0.25 um",
  journalFinish: "0.05 um",
} as const;

const stems = {
  nominal: "8.000 mm",
  length: "45.0 mm",
  tolerance: "0.005 mm",
  limitsSource: "Valve maker's sheet",
  boreMaterial: "bearing-bronze-c93200",
  journalMaterial: "steel-4140",
  boreFinish: "0.4 um",
  journalFinish: "0.2 um",
} as const;

const fits: FitSpec[] = [
  {
    ...shells,
    kind: "main",
    boreMaterial: "aluminium-356",
    nominal: "60.000 mm",
    length: "20.0 mm",
    usual: "0.064 mm",
    least: "0.032 mm",
    most: "0.085 mm",
  },
  {
    ...shells,
    kind: "big-end",
    boreMaterial: "steel-4340",
    nominal: "53.000 mm",
    length: "19.5 mm",
    usual: "0.060 mm",
    least: "0.030 mm",
    most: "0.080 mm",
  },
  {
    ...pins,
    kind: "pin-in-piston",
    length: "25.0 mm",
    usual: "0.018 mm",
    least: "0.005 mm",
    most: "0.030 mm",
    limitsSource: "Piston maker's sheet",
    boreMaterial: "aluminium-2618",
  },
  {
    ...pins,
    kind: "pin-in-rod",
    length: "24.0 mm",
    usual: "0.020 mm",
    least: "0.008 mm",
    most: "0.032 mm",
    limitsSource: "Rod maker's sheet",
    boreMaterial: "bearing-bronze-c93200",
  },
  { ...stems, kind: "intake-stem", usual: "0.040 mm", least: "0.020 mm", most: "0.075 mm" },
  { ...stems, kind: "exhaust-stem", usual: "0.065 mm", least: "0.030 mm", most: "0.100 mm" },
];

/** A flat four measured in millimetres that went to a thinner oil on the way; its seventh build is running. */
export const engine9: EngineSpec = {
  name: "Engine 9",
  form: "flat",
  cylinders: 4,
  mains: 5,
  valvesPerCylinder: 2,
  bore: "95.00 mm",
  stroke: "76.40 mm",
  rodLength: "137.00 mm",
  revLimitRpm: 7200,
  duty: "Circuit, endurance stints",
  environment: "clean",
  running: "circuit",
  gauges: "metric",
  fits,
  builds: 7,
  endsAs: "running",
  daysBetweenBuilds: 34,
  oils: [
    { fromBuild: 1, oil: "Ostrel 20W-50" },
    { fromBuild: 5, oil: "Ostrel 10W-40" },
  ],
  assigned: [],
};
