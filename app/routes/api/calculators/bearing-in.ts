import { z } from "zod";
import { amount } from "../frame/quantity-in";

const size = amount("length", { over: 0 });

/** A bearing without its clearance. */
export const bearingSize = { diameter: size, length: size };

/** Diametral. */
export const clearanceIn = amount("small-length", { over: 0 });

export const speedIn = amount("speed", { over: 0 });

export const viscosityIn = amount("dynamic-viscosity", { over: 0 });

/** The finishes of both faces, arithmetic mean roughness Ra. */
export const roughnessIn = z.strictObject({ bore: amount("finish"), journal: amount("finish") });
