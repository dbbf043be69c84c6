import { index, layout, prefix, type RouteConfig, route } from "@react-router/dev/routes";
import { apiRoutes } from "./routes/api/api-routes";

/** Every URL of the product. People and mails keep them: they do not change. */
export default [
  route("sign-in", "routes/account/sign-in.tsx"),
  route("sign-out", "routes/account/sign-out.ts"),

  layout("routes/signed-in.tsx", [
    index("routes/bench/bench.tsx"),

    ...prefix("engines", [
      index("routes/engines/engines.tsx"),
      route("new", "routes/engines/new-engine.tsx"),
      route(":engineId", "routes/engines/engine.tsx"),
      route(":engineId/fits/:fitId", "routes/engines/fit.tsx"),
    ]),

    ...prefix("builds/:buildId", [
      index("routes/builds/build.tsx"),
      route("sheet", "routes/builds/sheet.tsx"),
      route("runs", "routes/builds/runs.tsx"),
      route("teardown", "routes/builds/teardown.tsx"),
      route("review", "routes/builds/review.tsx"),
    ]),

    ...prefix("oils", [index("routes/oils/oils.tsx"), route("new", "routes/oils/new-oil.tsx")]),
    ...prefix("gauges", [index("routes/gauges/gauges.tsx"), route("new", "routes/gauges/new-gauge.tsx")]),

    ...prefix("calculators", [
      index("routes/calculators/calculators.tsx"),
      route("units", "routes/calculators/units.tsx"),
      route("clearance", "routes/calculators/clearance.tsx"),
      route("oil", "routes/calculators/oil.tsx"),
      route("film", "routes/calculators/film.tsx"),
      route("cycle", "routes/calculators/cycle.tsx"),
      route("map", "routes/calculators/map.tsx"),
      route("gauge-study", "routes/calculators/gauge-study.tsx"),
    ]),

    route("shop", "routes/shop/shop.tsx"),
    route("account", "routes/account/account.tsx"),
  ]),

  ...apiRoutes,
  route("*", "routes/not-found.tsx"),
] satisfies RouteConfig;
