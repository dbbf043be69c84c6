import { data, Form, href, redirect } from "react-router";
import { z } from "zod";
import { may, roleNames } from "~/access/permissions";
import { requireSignedIn } from "~/access/who.server";
import { Button } from "~/components/ui/button";
import { Choice } from "~/components/ui/choice";
import { ErrorSummary } from "~/components/ui/error-summary";
import { Field } from "~/components/ui/field";
import { Notice } from "~/components/ui/notice";
import { Page } from "~/components/ui/page";
import { Table } from "~/components/ui/table";
import { dayText } from "~/engineering/quantity/figures";
import { updatePreferences } from "~/models/person.server";
import { insertToken, listTokens, revokeToken } from "~/models/token.server";
import { orFormErrors, orPage, refuseForm } from "~/routes/answer.server";
import { fieldErrors, fieldsOf, text } from "~/routes/form-fields";
import type { Route } from "./+types/account";

export const meta: Route.MetaFunction = () => [{ title: "Your account · Tenthbook" }];

export async function loader({ request, context }: Route.LoaderArgs) {
  const { person, scope } = requireSignedIn({ request, context });
  const mayMakeTokens = may(person.role, "token:write");
  const tokens = mayMakeTokens ? await orPage(listTokens(scope)) : [];
  return {
    name: person.name,
    email: person.email,
    role: roleNames[person.role],
    shopName: person.shopName,
    units: person.units,
    theme: person.theme,
    mayMakeTokens,
    tokens: tokens.map((token) => ({
      id: token.id,
      name: token.name,
      scope: token.scope,
      made: dayText(token.created_at),
      used: token.last_used_at ? dayText(token.last_used_at) : "never",
      revoked: token.revoked_at ? dayText(token.revoked_at) : "",
    })),
  };
}

const accountForm = z.discriminatedUnion("intent", [
  z.object({ intent: z.literal("units"), units: z.enum(["inch", "metric"]), back: z.string().optional() }),
  z.object({ intent: z.literal("theme"), theme: z.enum(["system", "light", "dark"]) }),
  z.object({
    intent: z.literal("token"),
    name: text("Say what the token is for.", 60),
    scope: z.enum(["read", "write"], { error: "Say what the token may do." }),
  }),
  z.object({ intent: z.literal("revoke"), id: z.string() }),
]);

export async function action({ request, context }: Route.ActionArgs) {
  const { person, scope } = requireSignedIn({ request, context });
  const form = await request.formData();
  const typed = accountForm.safeParse(fieldsOf(form));
  if (!typed.success) return refuseForm(fieldErrors(typed.error), form);
  const asked = typed.data;
  return orFormErrors(form, async () => {
    switch (asked.intent) {
      case "units":
        await updatePreferences(scope, { units: asked.units });
        // Back to the page whose units were switched, if it is one of ours.
        throw redirect(asked.back && /^\/(?![/\\])/.test(asked.back) ? asked.back : href("/account"));
      case "theme":
        await updatePreferences(scope, { theme: asked.theme });
        return null;
      case "token":
        if (!may(person.role, "token:write")) throw data("Your role may not make tokens.", { status: 403 });
        return { token: await insertToken(scope, asked.name, asked.scope) };
      case "revoke":
        await revokeToken(scope, asked.id);
        return null;
    }
  });
}

export default function Account({ loaderData: account, actionData }: Route.ComponentProps) {
  const errors = actionData && "errors" in actionData ? actionData.errors : [];
  const token = actionData && "token" in actionData ? actionData.token : undefined;
  return (
    <Page
      title="Your account"
      subtitle={`${account.name} · ${account.role} at ${account.shopName} · ${account.email}`}
    >
      <ErrorSummary errors={errors} />
      <div className="grid max-w-3xl gap-9">
        <Form method="post" className="grid gap-3">
          <input type="hidden" name="intent" value="theme" />
          <Choice
            legend="Light"
            name="theme"
            type="radio"
            options={[
              { value: "system", label: "As the device" },
              { value: "light", label: "Day" },
              { value: "dark", label: "Night shift" },
            ]}
            defaultValue={account.theme}
          />
          <div>
            <Button type="submit">Set the light</Button>
          </div>
        </Form>
        {account.mayMakeTokens && (
          <section>
            <h2 className="mb-2 text-lg font-semibold">Tokens for the API</h2>
            <p className="mb-4 text-mute">
              A token does what you may do in this shop. Give each gauge or script its own.
            </p>
            {token && (
              <Notice tone="ok" title="Copy the token now; it is not shown again.">
                <code className="select-all break-all font-mono">{token}</code>
              </Notice>
            )}
            {account.tokens.length > 0 && (
              <Table caption="Your tokens">
                <thead>
                  <tr>
                    <th scope="col">for</th>
                    <th scope="col">may</th>
                    <th scope="col">made</th>
                    <th scope="col">last used</th>
                    <th scope="col">ended</th>
                  </tr>
                </thead>
                <tbody>
                  {account.tokens.map((row) => (
                    <tr key={row.id}>
                      <th scope="row">{row.name}</th>
                      <td>{row.scope}</td>
                      <td>{row.made}</td>
                      <td>{row.used}</td>
                      <td>
                        {row.revoked || (
                          <Form method="post">
                            <input type="hidden" name="intent" value="revoke" />
                            <input type="hidden" name="id" value={row.id} />
                            <Button type="submit" variant="quiet">
                              End it<span className="sr-only">: {row.name}</span>
                            </Button>
                          </Form>
                        )}
                      </td>
                    </tr>
                  ))}
                </tbody>
              </Table>
            )}
            <Form method="post" className="mt-5 grid gap-4">
              <input type="hidden" name="intent" value="token" />
              <Field
                label="What it is for"
                name="name"
                hint="Bore gauge at bench 2"
                error={errors.find((error) => error.path === "name")?.message}
              />
              <Choice
                legend="It may"
                name="scope"
                type="radio"
                options={[
                  { value: "read", label: "Read" },
                  { value: "write", label: "Read and write" },
                ]}
                defaultValue="read"
              />
              <div>
                <Button type="submit">Make a token</Button>
              </div>
            </Form>
          </section>
        )}
        <Form method="post" action={href("/sign-out")}>
          <Button type="submit">Sign out</Button>
        </Form>
      </div>
    </Page>
  );
}
