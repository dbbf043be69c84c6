import { href } from "react-router";
import type { Iteration } from "~/engineering/next-step/types";
import { format } from "~/engineering/quantity/format";

interface FitSizes {
  nominal_typed: string;
  length_typed: string | null;
  usual_typed: string;
  least_typed: string;
  most_typed: string;
  bore_finish_typed: string | null;
  journal_finish_typed: string | null;
}

/** The calculators with what is known of a fit filled in: its sizes, its latest aim, the oil it ran on. */
export function calculatorsFor(
  fit: FitSizes,
  latest: Iteration | undefined,
): { to: string; label: string }[] {
  const bearing = {
    diameter: fit.nominal_typed,
    length: fit.length_typed,
    boreRoughness: fit.bore_finish_typed,
    journalRoughness: fit.journal_finish_typed,
  };
  const clearance = latest ? `${format(latest.target, "in", 5)} in` : fit.usual_typed;
  const oil = latest?.oil;
  const temperature = oil?.temperatureC == null ? null : `${oil.temperatureC.toFixed(0)} degC`;
  return [
    {
      label: "Oil film of this fit",
      to: filled(href("/calculators/film"), {
        ...bearing,
        clearance,
        kv40: oil?.kv40,
        kv100: oil?.kv100,
        supplyTemperature: temperature,
      }),
    },
    {
      label: "Film map of this fit",
      to: filled(href("/calculators/map"), {
        ...bearing,
        clearanceFrom: fit.least_typed,
        clearanceTo: fit.most_typed,
        // Half and twice the viscosity it ran at: thinner and thicker oils of a grade either way lie inside.
        viscosityFrom: oil?.dynamicViscosity && `${(oil.dynamicViscosity * 500).toPrecision(2)} mPa s`,
        viscosityTo: oil?.dynamicViscosity && `${(oil.dynamicViscosity * 2000).toPrecision(2)} mPa s`,
      }),
    },
  ];
}

function filled(path: string, fields: Record<string, string | number | null | undefined>): string {
  const known = Object.entries(fields).filter(([, value]) => value !== null && value !== undefined);
  return `${path}?${new URLSearchParams(known.map(([name, value]) => [name, String(value)]))}`;
}
