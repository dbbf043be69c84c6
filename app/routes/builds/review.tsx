import { data, Form, href, Link } from "react-router";
import { z } from "zod";
import { may } from "~/access/permissions";
import { requirePerson } from "~/access/who.server";
import { Ladder } from "~/components/drawings/ladder";
import { Button } from "~/components/ui/button";
import { ErrorSummary } from "~/components/ui/error-summary";
import { Page } from "~/components/ui/page";
import { clearanceUnitName } from "~/engineering/quantity/figures";
import { findBuild, listBuilds } from "~/models/build.server";
import { findFit, listFits } from "~/models/fit.server";
import { listRungs } from "~/models/ladder.server";
import { proposalFor, recomputeProposal } from "~/models/proposal.server";
import { listSignatures, takeBuildFurther } from "~/models/sheet.server";
import { listDecisions } from "~/models/sign-off.server";
import { signProposal } from "~/models/sign-proposal.server";
import { orFormErrors, orPage, refuseForm } from "~/routes/answer.server";
import { stateWords } from "~/routes/engines/words";
import { fieldErrors, fieldsOf, note, optionalQuantity } from "~/routes/form-fields";
import type { Route } from "./+types/review";
import { BuildTabs } from "./build-tabs";
import { FitReview } from "./fit-review";
import { fitReview } from "./fit-review.server";

export const meta: Route.MetaFunction = ({ loaderData }) => [
  { title: `${loaderData?.title ?? "Review"} · Tenthbook` },
];

export async function loader({ request, context, params }: Route.LoaderArgs) {
  const { person, scope } = requirePerson({ request, context }, "engine:read");
  const build = await orPage(findBuild(scope, params.buildId));
  if (build.state !== "torn-down" && build.state !== "reviewed") {
    throw data(`Build ${build.number} is not torn down yet; there is nothing to review.`, { status: 404 });
  }
  const [fits, builds, rungs, signatures] = await Promise.all([
    listFits(scope, build.engine_id),
    listBuilds(scope, build.engine_id),
    listRungs(scope, build.engine_id),
    listSignatures(scope, build.id),
  ]);
  const isLatest = builds[0]?.id === build.id;
  const reviews = await Promise.all(
    fits.map(async (fit) =>
      fitReview(
        fit,
        await orPage(proposalFor(scope, fit, build)),
        await listDecisions(scope, fit.id),
        person.units,
      ),
    ),
  );
  return {
    id: build.id,
    engineId: build.engine_id,
    engineName: build.engineName,
    title: `${build.engineName}, build ${build.number}: review`,
    stands: stateWords[build.state],
    version: build.version,
    teardownSigned: signatures.some((signature) => signature.stage === "teardown"),
    open: reviews.filter((review) => !review.signOff).length,
    maySign: isLatest && may(person.role, "proposal:sign"),
    mayAsk: isLatest && may(person.role, "proposal:ask"),
    mayClose: build.state === "torn-down" && may(person.role, "proposal:sign"),
    rungs: rungs.map((rung) => ({ ...rung, to: href("/builds/:buildId/review", { buildId: rung.id }) })),
    reviews,
  };
}

const reviewAction = (units: "inch" | "metric") =>
  z.discriminatedUnion("intent", [
    z.object({
      intent: z.literal("sign"),
      fit: z.string(),
      decision: z.enum(["accept", "change", "decline"]),
      target: optionalQuantity("small-length", clearanceUnitName(units)),
      reason: note(1000),
      version: z.coerce.number().int(),
    }),
    z.object({ intent: z.literal("recompute"), fit: z.string() }),
    z.object({ intent: z.literal("close"), version: z.coerce.number().int() }),
  ]);

export async function action({ request, context, params }: Route.ActionArgs) {
  const form = await request.formData();
  const intent = form.get("intent");
  const { person, scope } = requirePerson(
    { request, context },
    intent === "recompute" ? "proposal:ask" : "proposal:sign",
  );
  const build = await orPage(findBuild(scope, params.buildId));
  const typed = reviewAction(person.units).safeParse(fieldsOf(form));
  if (!typed.success) return refuseForm(fieldErrors(typed.error), form);
  const asked = typed.data;
  return orFormErrors(form, async () => {
    switch (asked.intent) {
      case "sign":
        await signProposal(scope, await findFit(scope, build.engine_id, asked.fit), build, asked);
        return null;
      case "recompute":
        await recomputeProposal(scope, await findFit(scope, build.engine_id, asked.fit), build);
        return null;
      case "close":
        await takeBuildFurther(scope, build, "reviewed", asked.version);
        return null;
    }
  });
}

export default function Review({ loaderData: review, actionData }: Route.ComponentProps) {
  const refused = actionData ?? undefined;
  return (
    <Page
      title={review.title}
      subtitle={[
        review.stands,
        review.teardownSigned ? undefined : "the teardown sheet is not signed yet",
        review.open === 0
          ? "every fit is signed"
          : `${review.open} of ${review.reviews.length} fits wait for a signature`,
      ]
        .filter(Boolean)
        .join(" · ")}
      breadcrumbs={[
        { to: href("/engines"), label: "Engines" },
        { to: href("/engines/:engineId", { engineId: review.engineId }), label: review.engineName },
        { to: href("/builds/:buildId", { buildId: review.id }), label: "Build" },
      ]}
      aside={<Ladder title="The ladder" rungs={review.rungs} current={review.id} />}
    >
      <BuildTabs buildId={review.id} tornDown />
      <ErrorSummary errors={refused?.errors ?? []} />
      {review.reviews.map((fit) => (
        <FitReview
          key={fit.id}
          fit={fit}
          engineId={review.engineId}
          maySign={review.maySign}
          mayAsk={review.mayAsk}
          refused={refused?.values.fit === fit.id ? refused : undefined}
        />
      ))}
      {review.mayClose && (
        <Form method="post" className="mt-9 border-t border-line pt-5">
          <input type="hidden" name="intent" value="close" />
          <input type="hidden" name="version" value={review.version} />
          <p className="mb-3 max-w-prose text-mute">
            {review.open > 0
              ? `${review.open} fits are not signed; closed now, they keep their targets in the next build.`
              : "Every fit is signed."}
          </p>
          <Button type="submit" variant={review.open === 0 ? "primary" : "plain"}>
            Close the review
          </Button>
        </Form>
      )}
      <p className="mt-6">
        <Link to={href("/engines/:engineId", { engineId: review.engineId })}>
          Back to {review.engineName}
        </Link>
      </p>
    </Page>
  );
}
