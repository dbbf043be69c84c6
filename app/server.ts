import { createServer, type Server } from "node:http";
import { createRequestListener } from "@react-router/node";
import { RouterContextProvider, type ServerBuild } from "react-router";
import sirv from "sirv";
import { configuration } from "#database/configuration";
import { database } from "#database/connection";
import { seedDemo } from "#database/demo/seed";
import { migrate } from "#database/migrate";
import { addressContext } from "~/access/who.server";
import { refuseEarly } from "~/refuse-early";

/** Brings the database up to date, and in the demo fills a new one with the invented shop. */
export async function prepareDatabase(): Promise<void> {
  await migrate(database());
  if (configuration().demo) await seedDemo();
}

/** Serves the built product; resolves when it listens. */
export async function serve(clientDirectory: string): Promise<{ server: Server; address: string }> {
  await prepareDatabase();
  const files = sirv(clientDirectory, {
    // Vite's names carry a hash of what is inside, so they never change under a name.
    setHeaders: (response, path) => {
      if (path.startsWith("/assets/"))
        response.setHeader("Cache-Control", "public, max-age=31536000, immutable");
      response.setHeader("X-Content-Type-Options", "nosniff");
    },
  });
  const pages = createRequestListener({
    // The framework's own build is only there once Vite has made it.
    build: () => import("virtual:react-router/server-build") as Promise<ServerBuild>,
    getLoadContext: (_request, client) => {
      const context = new RouterContextProvider();
      context.set(addressContext, client.address);
      return context;
    },
  });
  const server = createServer((request, response) => {
    if (!refuseEarly(request, response)) files(request, response, () => pages(request, response));
  });
  // A body that never ends, or a client that never reads, must not hold a place for ever.
  server.requestTimeout = 120_000;
  server.headersTimeout = 20_000;
  const { host, port } = configuration();
  await new Promise<void>((resolve, reject) => {
    server.once("error", reject);
    server.listen(port, host, resolve);
  });
  const bound = server.address();
  const boundPort = typeof bound === "object" && bound ? bound.port : port;
  return { server, address: `http://${host === "127.0.0.1" ? "localhost" : host}:${boundPort}` };
}

export { demoPassword, demoSignIns } from "#database/demo/people";
