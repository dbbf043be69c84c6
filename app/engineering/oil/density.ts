import { requireWithin } from "../cycle/sound-input";

/** Density of an oil whose sheet does not give it, kg/m³ at 15 °C: usual for engine oils (common practice, no source). */
export const usualDensity15 = 870;

/**
 * Density of a lubricating oil at a temperature, kg/m³: ρ₁₅ exp(−a Δ (1 + 0.8 a Δ)), a = 0.6278/ρ₁₅ per °C, Δ from 15 °C.
 * Range: 700–1100 kg/m³ at 15 °C.
 * Source: API MPMS 11.1 / ASTM D1250, lubricating oils (form and constant as in public copies).
 * @throws EngineeringError `not-a-number`, `not-positive`, `outside-range`
 */
export function densityAt(density15: number, temperatureC: number): number {
  requireWithin(density15, "density15", { from: 700, to: 1100, unit: "kg/m³" });
  const thermal = (0.6278 / density15) * (temperatureC - 15);
  return density15 * Math.exp(-thermal * (1 + 0.8 * thermal));
}
