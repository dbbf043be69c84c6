import { z } from "zod";
import { postClearance } from "./calculators/clearance";
import { postConvert } from "./calculators/convert";
import { postCycle } from "./calculators/cycle";
import { postFilm } from "./calculators/film";
import { postFitLine } from "./calculators/fit-line";
import { postGaugeStudy } from "./calculators/gauge-study";
import { postMap } from "./calculators/map";
import { postOilCalculation } from "./calculators/oil";
import { postWear } from "./calculators/wear";
import { type Endpoint, endpoint } from "./frame/endpoint";
import { openApi } from "./frame/openapi";
import { postNextStep } from "./next-step/calculator";
import { getHistory, getNextStep, postNextStepOfFit, postSignature } from "./next-step/of-fit";
import { getBuild, postBuild, postState } from "./shop/builds";
import { getEngine, getEngines, postEngine } from "./shop/engines";
import { postFinding } from "./shop/findings";
import { getGauge, getGauges, postGauge } from "./shop/gauges";
import { getHealth } from "./shop/health";
import { postReadings } from "./shop/new-readings";
import { getOil, getOils, postOil } from "./shop/oils";
import { getReadings } from "./shop/readings";
import { postRun } from "./shop/runs";

const calculators = [
  postConvert,
  postClearance,
  postOilCalculation,
  postFilm,
  postCycle,
  postWear,
  postFitLine,
  postNextStep,
  postGaugeStudy,
  postMap,
];

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
  getHistory,
  getNextStep,
  postNextStepOfFit,
  postSignature,
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
  handle: async () => {
    description ??= openApi(endpoints);
    return description;
  },
});

let description: ReturnType<typeof openApi> | undefined;

/** Every call of the API, in the order that the page `/api` shows them. */
export const endpoints: readonly Endpoint[] = [...calculators, ...shop, getOpenApi];
