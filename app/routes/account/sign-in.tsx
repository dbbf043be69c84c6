import { Form, redirect } from "react-router";
import { authenticator } from "~/access/authenticator.server";
import { addressContext, whoContext } from "~/access/who.server";
import { Button } from "~/components/ui/button";
import { ErrorSummary } from "~/components/ui/error-summary";
import { Field } from "~/components/ui/field";
import { recordAttempt, secondsToWait } from "~/models/sign-in-attempt.server";
import { orFormErrors, refuseForm } from "~/routes/answer.server";
import { demoPassword, demoSignIns } from "~/services/demo.server";
import { sessions } from "~/services/session.server";
import type { Route } from "./+types/sign-in";

export const meta: Route.MetaFunction = () => [{ title: "Sign in · Tenthbook" }];

export function loader({ context, request }: Route.LoaderArgs) {
  if (context.get(whoContext)) throw redirect(wayBack(request));
  return { demo: demoSignIns() && { password: demoPassword, people: demoSignIns() } };
}

export async function action({ request, context }: Route.ActionArgs) {
  const form = await request.clone().formData();
  const email = String(form.get("email") ?? "").trim();
  const address = context.get(addressContext);
  const wait = await secondsToWait(email, address);
  if (wait > 0) {
    const message = `Too many tries. Wait ${wait} seconds, then try again.`;
    return refuseForm([{ path: "email", code: "throttled", message }], form, 429);
  }
  return orFormErrors(form, async () => {
    let person: Awaited<ReturnType<typeof authenticator.authenticate>>;
    try {
      person = await authenticator.authenticate("form", request);
    } catch (error) {
      await recordAttempt(email, address, false);
      throw error;
    }
    await recordAttempt(email, address, true);
    // A new session, whatever cookie the browser brought: an id from before the sign-in is worth nothing after it.
    const session = await sessions().getSession();
    session.set("personId", person.id);
    session.set("shopId", person.shopId);
    throw redirect(wayBack(request), { headers: { "Set-Cookie": await sessions().commitSession(session) } });
  });
}

/** Where the person was going, if that is a page of ours; a full URL or `//host` would lead them elsewhere. */
function wayBack(request: Request): string {
  const back = new URL(request.url).searchParams.get("back") ?? "/";
  return /^\/(?![/\\])/.test(back) ? back : "/";
}

export default function SignIn({ loaderData, actionData }: Route.ComponentProps) {
  const errors = actionData?.errors ?? [];
  return (
    <main className="mx-auto max-w-md px-7 py-14">
      <p className="mb-8 flex items-center gap-2 text-lg font-semibold">
        <img src="/mark.svg" alt="" width="26" height="26" /> Tenthbook
      </p>
      <h1 className="mb-5 text-2xl font-semibold">Sign in</h1>
      <ErrorSummary errors={errors} />
      <Form method="post" noValidate className="flex flex-col gap-5">
        <Field
          label="E-mail address"
          name="email"
          type="email"
          autoComplete="username"
          defaultValue={actionData?.values.email}
          error={errors.find((error) => error.path === "email")?.message}
        />
        <Field label="Password" name="password" type="password" autoComplete="current-password" />
        <div>
          <Button type="submit" variant="primary">
            Sign in
          </Button>
        </div>
      </Form>
      {loaderData.demo && (
        <section className="mt-10 border-t border-line pt-5">
          <h2 className="mb-2 text-lg font-semibold">This is the demo</h2>
          <p className="mb-3">
            Its shops and people are invented. Everyone's password is{" "}
            <code className="font-mono">{loaderData.demo.password}</code>.
          </p>
          <ul className="flex flex-col gap-1">
            {loaderData.demo.people?.map(({ email, what }) => (
              <li key={email}>
                <code className="font-mono">{email}</code> <span className="text-mute">{what}</span>
              </li>
            ))}
          </ul>
        </section>
      )}
    </main>
  );
}
