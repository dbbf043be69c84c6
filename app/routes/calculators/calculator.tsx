import type { ReactNode } from "react";
import { Form, href } from "react-router";
import { Button } from "~/components/ui/button";
import { ErrorSummary } from "~/components/ui/error-summary";
import { Field } from "~/components/ui/field";
import { Page } from "~/components/ui/page";
import { Table } from "~/components/ui/table";

interface CalculatorProps {
  title: string;
  subtitle: string;
  fields: readonly { name: string; label: string; hint?: string }[];
  typed: Record<string, string>;
  errors: readonly { path: string; message: string }[];
  /** More of the form than plain fields. */
  more?: ReactNode;
  children: ReactNode;
}

/** A calculator's page: a form whose address gives the inputs again, and below it what follows from them. */
export function Calculator({ title, subtitle, fields, typed, errors, more, children }: CalculatorProps) {
  return (
    <Page
      title={title}
      subtitle={subtitle}
      breadcrumbs={[{ to: href("/calculators"), label: "Calculators" }]}
    >
      <ErrorSummary errors={errors} />
      <Form method="get" noValidate className="mb-9 grid max-w-3xl gap-5">
        <div className="grid grid-cols-2 gap-4 sm:grid-cols-3">
          {fields.map(({ name, label, hint }) => (
            <Field
              key={name}
              label={label}
              hint={hint}
              name={name}
              defaultValue={typed[name] ?? ""}
              error={errors.find((error) => error.path === name)?.message}
            />
          ))}
        </div>
        {more}
        <div>
          <Button type="submit" variant="primary">
            Work it out
          </Button>
        </div>
      </Form>
      {children}
    </Page>
  );
}

/** Results as rows: what, and its value with its unit. */
export function Results({
  caption,
  rows,
}: {
  caption: string;
  rows: readonly { what: string; value: string }[];
}) {
  return (
    <div className="max-w-3xl">
      <Table caption={caption}>
        <tbody>
          {rows.map(({ what, value }) => (
            <tr key={what}>
              <th scope="row">{what}</th>
              <td>{value}</td>
            </tr>
          ))}
        </tbody>
      </Table>
    </div>
  );
}

/** What a result rests on: its assumptions, its range, its source, and the usual caution. */
export function Grounds({ sentences }: { sentences: readonly string[] }) {
  return (
    <div className="mt-6 max-w-prose text-[13px] text-mute">
      <ul className="mb-2 list-disc pl-5">
        {sentences.map((sentence) => (
          <li key={sentence}>{sentence}</li>
        ))}
      </ul>
      <p>
        A calculated value does not say that an engine will live with it: the parts maker's limits, the rules
        of the event and a qualified builder come first.
      </p>
    </div>
  );
}
