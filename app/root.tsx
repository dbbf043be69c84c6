import plexMono from "@fontsource/ibm-plex-mono/files/ibm-plex-mono-latin-400-normal.woff2?url";
import plexSans from "@fontsource/ibm-plex-sans/files/ibm-plex-sans-latin-400-normal.woff2?url";
import type { ReactNode } from "react";
import {
  isRouteErrorResponse,
  Links,
  Meta,
  Outlet,
  Scripts,
  ScrollRestoration,
  useRouteLoaderData,
} from "react-router";
import { guardOrigin } from "~/access/guard-origin.server";
import { findWho, markRequest, nonceContext, referenceContext, whoContext } from "~/access/who.server";
import type { Route } from "./+types/root";
import "./app.css";

export const links: Route.LinksFunction = () => [
  { rel: "icon", href: "/mark.svg", type: "image/svg+xml" },
  { rel: "preload", href: plexSans, as: "font", type: "font/woff2", crossOrigin: "anonymous" },
  { rel: "preload", href: plexMono, as: "font", type: "font/woff2", crossOrigin: "anonymous" },
];

export const middleware: Route.MiddlewareFunction[] = [markRequest, guardOrigin, findWho];

export function loader({ context }: Route.LoaderArgs) {
  return {
    nonce: context.get(nonceContext),
    reference: context.get(referenceContext),
    theme: context.get(whoContext)?.theme ?? "system",
  };
}

export function Layout({ children }: { children: ReactNode }) {
  const root = useRouteLoaderData<typeof loader>("root");
  const theme = root?.theme ?? "system";
  return (
    <html lang="en" {...(theme === "system" ? {} : { "data-theme": theme })}>
      <head>
        <meta charSet="utf-8" />
        <meta name="viewport" content="width=device-width, initial-scale=1" />
        <meta name="color-scheme" content="light dark" />
        <Meta />
        <Links />
      </head>
      <body>
        {children}
        <ScrollRestoration nonce={root?.nonce} />
        <Scripts nonce={root?.nonce} />
      </body>
    </html>
  );
}

export default function Root() {
  return <Outlet />;
}

export function ErrorBoundary({ error }: Route.ErrorBoundaryProps) {
  const known = isRouteErrorResponse(error);
  const status = known ? error.status : 500;
  const reference = useRouteLoaderData<typeof loader>("root")?.reference;
  const said = known && typeof error.data === "string" ? error.data : undefined;
  return (
    <main className="mx-auto max-w-2xl px-7 py-16">
      <title>{`${headings[status] ?? headings[500]} · Tenthbook`}</title>
      <h1 className="mb-3 text-2xl font-semibold">{headings[status] ?? headings[500]}</h1>
      <p className="mb-6">
        {said || explanations[status] || explanations[500]}
        {status === 500 && reference && ` The log has it under ${reference}.`}
      </p>
      <p>
        <a href="/" className="text-layout underline">
          Back to the bench
        </a>
      </p>
    </main>
  );
}

const headings: Record<number, string> = {
  400: "That request made no sense",
  403: "Not yours to do",
  404: "There is nothing here",
  409: "Someone was faster",
  500: "Something broke on our side",
};

const explanations: Record<number, string> = {
  404: "The address is wrong, or what stood here is not yours to see.",
  500: "What you had saved is safe. Try again; if it stays, tell the owner of this installation.",
};
