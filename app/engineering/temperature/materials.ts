import { EngineeringError } from "../engineering-error";

/** A material's linear expansion, per °C, with the standard uncertainty of that figure and where it is from. */
export interface Material {
  key: string;
  name: string;
  expansion: number;
  uncertainty: number;
  source: string;
}

const table = "Callister, Fundamentals of Materials Science and Engineering, 3rd ed., table B.6";
// The values were read in collections that name both sources; which row is of which is from memory.
const alloys = "a handbook's table of aluminium casting and forging alloys";

// Handbook tables print a coefficient to three figures and do not say how sure it is; alloys of one name differ by
// about 3 % (common practice, no source), taken here as the half-width of a rectangular distribution (GUM 4.3.7).
const material = (key: string, name: string, expansion: number, source: string): Material => ({
  key,
  name,
  expansion: expansion * 1e-6,
  uncertainty: (expansion * 1e-6 * 0.03) / Math.sqrt(3),
  source,
});

/** The usual materials of an engine, mean coefficients near room temperature. A shop adds its own. */
export const materials: readonly Material[] = [
  material("steel-4340", "Steel 4340", 12.3, table),
  material("steel-4140", "Steel 4140", 12.3, table),
  material("steel-1040", "Steel 1040", 11.3, table),
  material("steel-1020", "Steel 1020 (and a shell's steel back)", 11.7, table),
  material("gray-iron", "Gray iron", 11.4, table),
  material("ductile-iron-60-40-18", "Ductile iron 60-40-18", 11.2, table),
  material("ductile-iron-80-55-06", "Ductile iron 80-55-06", 10.6, table),
  material("aluminium-356", "Aluminium 356", 21.5, table),
  material("aluminium-319", "Aluminium 319", 21.5, alloys),
  material("aluminium-a132", "Aluminium A132", 19.0, alloys),
  material("aluminium-4032", "Aluminium 4032", 19.4, alloys),
  material("aluminium-2218", "Aluminium 2218", 22.3, alloys),
  material("aluminium-2618", "Aluminium 2618", 22.3, "from memory"),
  material("aluminium-2024", "Aluminium 2024", 22.9, table),
  material("aluminium-6061", "Aluminium 6061", 23.6, table),
  material("bearing-bronze-c93200", "Bearing bronze C93200", 18.0, table),
  material("phosphor-bronze-c51000", "Phosphor bronze C51000", 17.8, table),
  material("cartridge-brass-c26000", "Cartridge brass C26000", 19.9, table),
  material("free-cutting-brass-c36000", "Free-cutting brass C36000", 20.5, table),
  material("titanium-6al-4v", "Titanium 6Al-4V", 8.6, table),
];

/** A material of the table by its key. @throws EngineeringError `unknown-material` */
export function findMaterial(key: string, own: readonly Material[] = []): Material {
  const found = [...own, ...materials].find((candidate) => candidate.key === key);
  if (!found)
    throw new EngineeringError(
      "unknown-material",
      "material",
      `No material is called "${key.slice(0, 40)}".`,
    );
  return found;
}
