import { Form, href, Link } from "react-router";
import { ClearanceByBuild } from "~/components/drawings/clearance-by-build";
import { FitStrip } from "~/components/drawings/fit-strip";
import { WearBars } from "~/components/drawings/wear-bars";
import { Button } from "~/components/ui/button";
import { ErrorSummary } from "~/components/ui/error-summary";
import { Field } from "~/components/ui/field";
import { Notice } from "~/components/ui/notice";
import { clearanceUnit } from "~/engineering/quantity/figures";
import type { FormRefusal } from "~/routes/answer.server";
import { PastDecisions } from "~/routes/engines/past-decisions";
import type { FitReviewData } from "./fit-review.server";

interface FitReviewProps {
  fit: FitReviewData;
  engineId: string;
  maySign: boolean;
  mayAsk: boolean;
  refused: FormRefusal | undefined;
}

/** One fit of a review: what was measured, what is proposed and why, and the chief's decision. */
export function FitReview({ fit, engineId, maySign, mayAsk, refused }: FitReviewProps) {
  const unit = clearanceUnit(fit.units);
  const { verb, step, target, oil } = fit.headline;
  return (
    <section className="border-t border-line py-6 first:border-t-0" aria-label={fit.name}>
      <div className="mb-2 flex flex-wrap items-baseline gap-x-4">
        <h2 className="text-lg font-semibold">
          <Link to={href("/engines/:engineId/fits/:fitId", { engineId, fitId: fit.id })} className="text-ink">
            {fit.name}
          </Link>
        </h2>
        <p className="text-mute">
          {fit.measured} of {fit.positions} measured before and after · sure to ±{" "}
          <span className="font-mono">{fit.uncertainty}</span> {unit}
        </p>
      </div>
      {fit.strip && (
        <FitStrip
          title={`${fit.name}, build under review`}
          units={fit.units}
          window={fit.strip.window}
          limits={fit.strip.limits}
          positions={fit.strip.positions}
          likelyLimit={fit.strip.likelyLimit}
          step={fit.strip.step}
        />
      )}
      {fit.stale && (
        <Notice tone="watch" title="The evidence has changed since this was worked out.">
          {mayAsk && (
            <Form method="post" preventScrollReset>
              <input type="hidden" name="fit" value={fit.id} />
              <Button type="submit" name="intent" value="recompute" variant="quiet">
                Work it out again
              </Button>
            </Form>
          )}
        </Notice>
      )}
      <p className="mt-3 mb-2 text-lg">
        <strong className="font-semibold text-layout">
          {verb}
          {step && (
            <>
              {" "}
              by <span className="font-mono">{step}</span>
            </>
          )}
        </strong>
        {oil ? " on this oil; the next thing to change is the oil. Clearance " : step ? ", to " : " at "}
        <span className="font-mono">{target}</span> {unit}.
      </p>
      <ul className="mb-3 grid list-disc gap-x-9 gap-y-1 pl-5 md:grid-cols-2">
        {fit.reasons.map((reason) => (
          <li key={reason}>{reason}</li>
        ))}
      </ul>
      {fit.cautions.map((caution) => (
        <p key={caution} className="mb-1 text-watch">
          <span aria-hidden="true">! </span>
          {caution}
        </p>
      ))}
      {fit.signOff ? (
        <Signed fit={fit} unit={unit} />
      ) : (
        maySign && <SignForm fit={fit} unit={unit} refused={refused} />
      )}
      <p className="mt-3 max-w-prose text-[13px] text-mute">
        {fit.cannotSee.join(" ")} Limits: {fit.limits}. The parts maker's limits, the rules of the event and a
        qualified builder come before this proposal. You decide.
      </p>
      <details className="mt-2">
        <summary className="flex min-h-11 cursor-pointer items-center">
          What would change it, the builds so far, and the wear
        </summary>
        <ul className="mb-4 list-disc pl-5">
          {fit.wouldChange.map((sentence) => (
            <li key={sentence}>{sentence}</li>
          ))}
        </ul>
        <ClearanceByBuild title={`${fit.name}, clearance by build`} units={fit.units} builds={fit.builds} />
        <PastDecisions decisions={fit.decisions} />
        {fit.wear.length > 0 && (
          <WearBars title={`${fit.name}, wear per hour`} units={fit.units} bars={fit.wear} />
        )}
      </details>
    </section>
  );
}

function Signed({ fit, unit }: { fit: FitReviewData; unit: string }) {
  const words = { accept: "Accepted", change: "Changed", decline: "Declined" } as const;
  if (!fit.signOff) return null;
  const { decision, target, reason, by, day } = fit.signOff;
  return (
    <p className="mt-3 border-l-4 border-ok px-4 py-2">
      <strong className="font-semibold">{words[decision]}</strong>: the next build aims at{" "}
      <span className="font-mono">{target}</span> {unit}. {by}, {day}.{reason && ` ${reason}`}
    </p>
  );
}

interface SignFormProps {
  fit: FitReviewData;
  unit: string;
  refused: FormRefusal | undefined;
}

function SignForm({ fit, unit, refused }: SignFormProps) {
  const errorOf = (path: string) => refused?.errors.find((error) => error.path === path)?.message;
  const hidden = (decision: string) => (
    <>
      <input type="hidden" name="intent" value="sign" />
      <input type="hidden" name="fit" value={fit.id} />
      <input type="hidden" name="version" value={fit.version} />
      <input type="hidden" name="decision" value={decision} />
    </>
  );
  const changing = refused?.values.decision === "change";
  const declining = refused?.values.decision === "decline";
  return (
    <div className="mt-4 flex flex-wrap items-start gap-3">
      <Form method="post" preventScrollReset>
        {hidden("accept")}
        <Button type="submit" variant="primary">
          Sign: {fit.headline.verb.toLowerCase()}
          {fit.headline.step && ` by ${fit.headline.step}`}
          <span className="sr-only">, {fit.name}</span>
        </Button>
      </Form>
      <details open={changing}>
        <summary className="flex min-h-11 cursor-pointer items-center rounded border border-line-strong bg-paper px-4 font-semibold">
          Change it<span className="sr-only">, {fit.name}</span>
        </summary>
        <Form method="post" preventScrollReset noValidate className="mt-3 grid w-80 gap-3">
          {changing && <ErrorSummary errors={refused.errors.filter((error) => error.path === "")} />}
          {hidden("change")}
          <Field
            label="Target of the next build"
            name="target"
            suffix={unit}
            defaultValue={changing ? refused.values.target : ""}
            error={changing ? errorOf("target") : undefined}
          />
          <Field
            label="Why"
            name="reason"
            defaultValue={changing ? refused.values.reason : ""}
            error={changing ? errorOf("reason") : undefined}
          />
          <Button type="submit">Sign the change</Button>
        </Form>
      </details>
      <details open={declining}>
        <summary className="flex min-h-11 cursor-pointer items-center rounded border border-line-strong bg-paper px-4 font-semibold">
          Decline<span className="sr-only">, {fit.name}</span>
        </summary>
        <Form method="post" preventScrollReset noValidate className="mt-3 grid w-80 gap-3">
          {hidden("decline")}
          <p className="text-mute">The fit keeps its target in the next build.</p>
          <Field
            label="Why"
            name="reason"
            defaultValue={declining ? refused.values.reason : ""}
            error={declining ? errorOf("reason") : undefined}
          />
          <Button type="submit">Decline and sign</Button>
        </Form>
      </details>
    </div>
  );
}
