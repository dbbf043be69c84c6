import { ConditionGlyph } from "~/components/drawings/condition-glyph";
import { Table } from "~/components/ui/table";
import type { Iteration } from "~/engineering/next-step/types";
import { worstGrade } from "~/engineering/next-step/worst-grade";
import { clearanceText, clearanceUnit, dayText, type PageUnits } from "~/engineering/quantity/figures";
import { inWords } from "~/engineering/trade/condition";

interface Decision {
  number: number;
  action: string;
  subject: string;
  stepPm: number;
  proposedPm: number;
  decision: string | null;
  signedPm: number | null;
  reason: string | null;
  signedAt: string | null;
  personName: string | null;
}

const decided: Record<string, string> = { accept: "accepted", change: "changed", decline: "declined" };

/** What was proposed and decided at each build, as a page shows it, newest first. */
export function pastDecisions(
  decisions: readonly Decision[],
  iterations: readonly Iteration[],
  units: PageUnits,
) {
  return {
    unit: clearanceUnit(units),
    rows: decisions
      .map((row) => ({
        build: row.number,
        proposed: `${row.action.replaceAll("-", " ")}${row.subject === "oil" ? ", oil" : ""}`,
        to: clearanceText(row.proposedPm, units),
        decision: row.decision ? decided[row.decision]! : "not signed",
        signed: row.signedPm === null ? "" : clearanceText(row.signedPm, units),
        by: row.personName ? `${row.personName}, ${dayText(row.signedAt!)}` : "",
        reason: row.reason ?? "",
        outcome: outcomeAfter(row.number, iterations),
      }))
      .reverse(),
  };
}

/** How the build after a decision came down: its worst grade and what happened in it. */
function outcomeAfter(build: number, iterations: readonly Iteration[]) {
  const next = iterations.find((iteration) => iteration.build > build);
  if (!next) return undefined;
  return { build: next.build, grade: worstGrade(next), events: next.events.map(inWords).join(", ") };
}

/** The table of them. */
export function PastDecisions({ decisions }: { decisions: ReturnType<typeof pastDecisions> }) {
  if (decisions.rows.length === 0) return null;
  return (
    <Table caption="What was proposed and what was signed">
      <thead>
        <tr>
          <th scope="col">build</th>
          <th scope="col">proposed</th>
          <th scope="col">to, {decisions.unit}</th>
          <th scope="col">decision</th>
          <th scope="col">signed, {decisions.unit}</th>
          <th scope="col">by</th>
          <th scope="col">reason</th>
          <th scope="col">the build after</th>
        </tr>
      </thead>
      <tbody>
        {decisions.rows.map((row) => (
          <tr key={row.build}>
            <th scope="row">Build {row.build}</th>
            <td className="words">{row.proposed}</td>
            <td>{row.to}</td>
            <td className="words">{row.decision}</td>
            <td>{row.signed}</td>
            <td className="words">{row.by}</td>
            <td className="words">{row.reason}</td>
            <td className="words">
              {row.outcome ? (
                <span className="flex items-center gap-2">
                  {row.outcome.grade !== undefined && <ConditionGlyph grade={row.outcome.grade} />}
                  {row.outcome.events}
                </span>
              ) : (
                "not torn down yet"
              )}
            </td>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}
