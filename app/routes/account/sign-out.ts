import { redirect } from "react-router";
import { sessions } from "~/services/session.server";
import type { Route } from "./+types/sign-out";

/** A link here from an old page leads home; only a form ends the session. */
export function loader() {
  return redirect("/");
}

export async function action({ request }: Route.ActionArgs) {
  const session = await sessions().getSession(request.headers.get("Cookie"));
  throw redirect("/sign-in", { headers: { "Set-Cookie": await sessions().destroySession(session) } });
}
