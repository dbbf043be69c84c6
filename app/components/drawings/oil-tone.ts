/** The kinematic viscosities at 100 °C, mm²/s, that are drawn palest and darkest: SAE J300's least for 16 and most for 60. */
const thinnest = 6.1;
const thickest = 26.1;

/** The tone of an oil by its kinematic viscosity at 100 °C (mm²/s): thin is pale, thick is dark. Its grade is written beside it. */
export function oilTone(kv100: number | undefined): string {
  if (kv100 === undefined || !(kv100 > 0)) return "var(--line)";
  const share = Math.log(kv100 / thinnest) / Math.log(thickest / thinnest);
  const percent = Math.round(200 * Math.min(1, Math.max(0, share)));
  return percent <= 100
    ? `color-mix(in oklab, var(--oil-middle) ${percent}%, var(--oil-thin))`
    : `color-mix(in oklab, var(--oil-thick) ${percent - 100}%, var(--oil-middle))`;
}
