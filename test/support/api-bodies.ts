/** A small engine as a script sets it up: two cylinders in line, one fit of two big ends. */
export function engineBody(name = "Engine of the tests") {
  return {
    name,
    layout: { form: "inline", cylinders: 2, mains: 3, valvesPerCylinder: 4 },
    bore: "81 mm",
    stroke: "58.2 mm",
    rodLength: "4.2 in",
    revLimit: "11000 rpm",
    environment: "clean",
    fits: [
      {
        kind: "big-end",
        nominal: "2.1000 in",
        length: "0.85 in",
        usual: "0.0025 in",
        hardLimits: { least: "0.0010 in", most: "0.0032 in" },
      },
    ],
  };
}
