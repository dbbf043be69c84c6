import { referenceContext } from "~/access/who.server";
import type { Route } from "./+types/version-1";
import { endpoints } from "./endpoints";
import { answerCall } from "./frame/answer.server";

/** Every call of the API that reads; an address or a method that it does not have is answered here too. */
export function loader({ request, context }: Route.LoaderArgs) {
  return answerCall(endpoints, request, context.get(referenceContext));
}

/** Every call of the API that sends a body. */
export function action({ request, context }: Route.ActionArgs) {
  return answerCall(endpoints, request, context.get(referenceContext));
}
