/** What the core throws when it is asked for something impossible: never NaN, never a silent guess. */
export class EngineeringError extends Error {
  override readonly name = "EngineeringError";

  /**
   * @param code stable, kebab-case, for programs: `not-positive`, `interference`, `outside-range` …
   * @param field the input that is wrong, by its name in the call: `clearance`, `positions[2].bore`
   * @param message a sentence a builder understands: what is wrong, with what, what to do
   */
  constructor(
    readonly code: string,
    readonly field: string,
    message: string,
  ) {
    super(message);
  }
}
