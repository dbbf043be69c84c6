import { EngineeringError } from "../engineering-error";

/** Exact whole picometres as metres, the nearest number there is. */
export function metres(picometres: number): number {
  return picometres / 1e12;
}

/**
 * Metres as the nearest whole picometre.
 * @throws EngineeringError `not-a-number`; `too-large` over 9000 m, where a number of picometres is no longer exact
 */
export function picometres(metres: number): number {
  if (Number.isNaN(metres)) throw new EngineeringError("not-a-number", "value", "This length is no number.");
  const value = Math.round(metres * 1e12);
  if (!Number.isSafeInteger(value)) {
    throw new EngineeringError("too-large", "value", "This length is larger than anything in an engine.");
  }
  return value === 0 ? 0 : value;
}
