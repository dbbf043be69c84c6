import { z } from "zod";
import { type Endpoint, endpoint } from "./frame/endpoint";
import { openApi } from "./frame/openapi";
import { getBuild, postBuild, postState } from "./shop/builds";
import { getEngine, getEngines, postEngine } from "./shop/engines";
import { postFinding } from "./shop/findings";
import { getGauge, getGauges, postGauge } from "./shop/gauges";
import { getHealth } from "./shop/health";
import { getOil, getOils, postOil } from "./shop/oils";
import { getReadings, postReadings } from "./shop/readings";
import { postRun } from "./shop/runs";

const shop = [
  getHealth,
  getEngines,
  postEngine,
  getEngine,
  postBuild,
  getBuild,
  postReadings,
  getReadings,
  postState,
  postRun,
  postFinding,
  getOils,
  postOil,
  getOil,
  getGauges,
  postGauge,
  getGauge,
];

const getOpenApi = endpoint({
  method: "GET",
  path: "/openapi.json",
  who: "everyone",
  title: "This API as OpenAPI 3.1",
  answer: z.record(z.string(), z.unknown()),
  handle: async () => openApi(endpoints),
});

/** Every call of the API, in the order that the page `/api` shows them. */
export const endpoints: readonly Endpoint[] = [...shop, getOpenApi];
