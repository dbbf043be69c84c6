import type { EngineSpec } from "../engine-spec";

const shells = {
  tolerance: "0.008 mm",
  limitsSource: "Shell maker's sheet, with the set",
  boreMaterial: "gray-iron",
  journalMaterial: "steel-4340",
  boreFinish: "0.2 um",
  journalFinish: "0.15 um",
} as const;

/** The one engine of the second shop: nobody of the first shop ever sees it. */
export const engineOfSecondShop: EngineSpec = {
  name: "Engine A",
  form: "inline",
  cylinders: 3,
  mains: 4,
  valvesPerCylinder: 4,
  bore: "78.00 mm",
  stroke: "69.60 mm",
  rodLength: "121.00 mm",
  revLimitRpm: 9000,
  duty: "Hill climbs",
  environment: "clean",
  running: "circuit",
  gauges: "metric",
  fits: [
    {
      ...shells,
      kind: "main",
      nominal: "52.000 mm",
      length: "18.0 mm",
      usual: "0.055 mm",
      least: "0.028 mm",
      most: "0.075 mm",
    },
    {
      ...shells,
      kind: "big-end",
      boreMaterial: "steel-4340",
      nominal: "51.000 mm",
      length: "17.0 mm",
      usual: "0.052 mm",
      least: "0.026 mm",
      most: "0.070 mm",
    },
  ],
  builds: 2,
  endsAs: "running",
  daysBetweenBuilds: 30,
  oils: [{ fromBuild: 1, oil: "Vindle 5W-30" }],
  assigned: [],
};
