import { EngineeringError } from "../engineering-error";

/** Exact integer picometres as metres. */
export function metres(picometres: number): number {
  return picometres / 1e12;
}

/** Metres as the nearest whole picometre. @throws EngineeringError `too-large` over 9000 m, where a number is no longer exact */
export function picometres(metres: number): number {
  const value = Math.round(metres * 1e12);
  if (!Number.isSafeInteger(value)) {
    throw new EngineeringError("too-large", "value", "This length is larger than anything in an engine.");
  }
  return value === 0 ? 0 : value;
}
