import { type RouteConfigEntry, route } from "@react-router/dev/routes";

/** The JSON API and the page that shows it; `endpoints.ts` lists the calls below `/api/v1`. */
export const apiRoutes: RouteConfigEntry[] = [
  route("api", "routes/api/page.tsx"),
  route("api/v1/*", "routes/api/version-1.ts"),
];
