import type { Role } from "~/access/permissions";

/** Who asks, and in which shop. Every model function takes it first, so that no query forgets whose data it is. */
export interface Scope {
  shopId: string;
  personId: string;
  role: Role;
}
