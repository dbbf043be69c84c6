/** What a person can be in a shop. */
export const roles = ["owner", "builder", "crew-chief", "tuner", "viewer"] as const;
export type Role = (typeof roles)[number];

export const roleNames: Record<Role, string> = {
  owner: "Owner",
  builder: "Builder",
  "crew-chief": "Crew chief",
  tuner: "Tuner",
  viewer: "Viewer",
};

const everyone: readonly Role[] = roles;
const theShop: readonly Role[] = ["owner", "builder", "crew-chief", "tuner"];

/**
 * The one table of who may do what. Routes refuse by it and pages show or hide by it, so they cannot disagree.
 * Crew chiefs and viewers may do these things only to the engines they are assigned to.
 */
export const permissions = {
  "engine:read": everyone,
  "engine:write": ["owner", "builder"],
  "build:write": ["owner", "builder"],
  "reading:write": ["owner", "builder"],
  "sheet:sign": ["owner", "builder"],
  "run:write": ["owner", "builder", "crew-chief", "tuner"],
  "finding:write": ["owner", "builder", "crew-chief"],
  "proposal:ask": ["owner", "builder", "crew-chief", "tuner"],
  "proposal:sign": ["owner", "crew-chief"],
  "oil:read": theShop,
  "oil:write": ["owner", "tuner"],
  "gauge:read": theShop,
  "gauge:write": ["owner", "builder"],
  "shop:read": ["owner"],
  "shop:write": ["owner"],
  "token:write": theShop,
} as const satisfies Record<string, readonly Role[]>;

export type Permission = keyof typeof permissions;

/** Whether a role may do a thing at all; which engines it may do it to is for the query to say. */
export function may(role: Role, permission: Permission): boolean {
  return (permissions[permission] as readonly Role[]).includes(role);
}

/** Roles that see only the engines they are assigned to. */
export function seesOnlyAssigned(role: Role): boolean {
  return role === "crew-chief" || role === "viewer";
}
