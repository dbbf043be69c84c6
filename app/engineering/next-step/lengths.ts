import { format, formatWithUnit } from "../quantity/format";
import { tenth } from "./rules";
import type { Units } from "./types";

/** A clearance or target as the trade writes it: "0.0021 in", "0.00215 in"; "53.3 µm". m in. */
export function clearanceText(length: number, units: Units): string {
  if (units === "metric") return formatWithUnit(length, "um", 1);
  return `${format(length, "in", 5).replace(/0$/, "")} in`;
}

/** A clearance that is only believed, to a tenth or a micron: "0.0016 in"; "41 µm". m in. */
export function roughlyText(length: number, units: Units): string {
  return units === "metric" ? formatWithUnit(length, "um", 0) : formatWithUnit(length, "in", 4);
}

/** A step or an uncertainty, without its sign: "2 tenths (0.0002 in)"; "5.1 µm". m in. */
export function stepText(length: number, units: Units): string {
  const size = Math.abs(length);
  if (units === "metric") return formatWithUnit(size, "um", 1);
  const tenths = Math.round((size / tenth) * 10) / 10;
  return `${tenths} ${tenths === 1 ? "tenth" : "tenths"} (${clearanceText(size, units)})`;
}

/** A wear rate: "4.2 µin/h"; "0.11 µm/h". m/h in. */
export function rateText(rate: number, units: Units): string {
  return units === "metric" ? `${format(rate, "um", 2)} µm/h` : `${format(rate, "uin", 1)} µin/h`;
}

/** A temperature: "221 °F"; "105 °C". */
export function temperatureText(temperatureC: number, units: Units): string {
  return formatWithUnit(temperatureC, units === "metric" ? "degC" : "degF", 0);
}

/** A probability as people say it: "7 in 10", "1 in 50", "hardly any". */
export function chanceText(chance: number): string {
  if (chance > 0.97) return "nearly certain";
  if (chance >= 0.15) return `about ${Math.round(chance * 10)} in 10`;
  if (chance < 0.001) return "less than 1 in 1000";
  return `about 1 in ${Number((1 / chance).toPrecision(1))}`;
}
