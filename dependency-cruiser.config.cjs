// The arrows of the architecture: who may import whom. `npm run lint` checks them.
const arrow = (from, to, why) => ({
  name: `${from}-to-${to}`,
  severity: "error",
  comment: why,
  from: { path: `^app/${from}/` },
  to: { path: to.startsWith("^") ? to : `^app/${to}/` },
});

module.exports = {
  forbidden: [
    { name: "no-circles", severity: "error", from: {}, to: { circular: true } },
    {
      name: "engineering-stands-alone",
      severity: "error",
      comment: "the core imports nothing of the application",
      from: { path: "^app/engineering/" },
      to: { path: "^(app/(?!engineering/)|database/|scripts/|test/)" },
    },
    {
      name: "database-knows-no-application",
      severity: "error",
      from: { path: "^database/", pathNot: "^database/demo/" },
      to: { path: "^app/" },
    },
    {
      name: "demo-uses-models-and-core",
      severity: "error",
      from: { path: "^database/demo/" },
      to: { path: "^app/(?!models/|engineering/|access/permissions)" },
    },
    arrow("components", "models", "a component gets its data from its route"),
    arrow("components", "services", "a component gets its data from its route"),
    arrow("components", "routes", "routes use components, not the other way"),
    arrow("components", "^database/", "a component gets its data from its route"),
    arrow("models", "routes", "models know no pages"),
    arrow("models", "components", "models know no pages"),
    arrow("models", "services", "models are only data and rules"),
    arrow("services", "routes", "services know no pages"),
    arrow("services", "components", "services know no pages"),
    arrow("services", "models", "services reach the outside world; rules live in models"),
    arrow("routes", "^database/", "SQL lives in models"),
  ],
  options: {
    doNotFollow: { path: "node_modules" },
    tsPreCompilationDeps: true,
    tsConfig: { fileName: "tsconfig.json" },
    exclude: { path: "\\.test\\.tsx?$|^\\.react-router" },
    enhancedResolveOptions: {
      exportsFields: ["exports"],
      conditionNames: ["import", "require", "node", "default", "types"],
    },
  },
};
