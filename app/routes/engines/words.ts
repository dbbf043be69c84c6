/** An engine in a few words: "V8, dusty duty". */
export function engineKind(engine: { form: string; cylinders: number; environment: string }): string {
  const counts: Record<number, string> = {
    1: "one",
    2: "two",
    3: "three",
    4: "four",
    5: "five",
    6: "six",
    8: "eight",
  };
  const count = counts[engine.cylinders] ?? String(engine.cylinders);
  const form = engine.form === "V" ? `V${engine.cylinders}` : `${engine.form} ${count}`;
  return `${form}, ${engine.environment} duty`;
}

/** Where a build stands, as it follows its number: "build 7 torn down". */
export const stateWords = {
  measuring: "on the bench, being measured",
  assembled: "assembled",
  running: "running",
  "torn-down": "torn down",
  reviewed: "reviewed",
} as const;
