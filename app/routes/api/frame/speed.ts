const perMinute = (2 * Math.PI) / 60;

/** Revolutions a minute as rad/s. */
export function rpmOf(rpm: number): number {
  return rpm * perMinute;
}

/** rad/s as revolutions a minute. */
export function inRpm(speed: number): number {
  return speed / perMinute;
}
