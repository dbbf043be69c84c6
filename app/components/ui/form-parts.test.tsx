import { cleanup, fireEvent, render, screen } from "@testing-library/react";
import { renderToStaticMarkup } from "react-dom/server";
import { afterEach, describe, expect, it } from "vitest";
import { Choice } from "./choice";
import { ErrorSummary } from "./error-summary";
import { Field } from "./field";
import { Select } from "./select";

afterEach(cleanup);

const tooWide = "0.22 in is wider than the hard limit of .0032 in.";

describe("a field", () => {
  it("is described by its hint, its error and its unit", () => {
    render(<Field label="Target" name="target" hint="Diametral" suffix="in" error={tooWide} />);
    const box = screen.getByLabelText("Target");
    const described = box.getAttribute("aria-describedby")?.split(" ") ?? [];
    expect(described.map((id) => document.getElementById(id)?.textContent)).toEqual([
      "Diametral",
      `Error: ${tooWide}`,
      "in",
    ]);
    expect(box.getAttribute("aria-invalid")).toBe("true");
  });

  it("keeps what was typed, and says nothing of mistakes where there is none", () => {
    render(<Field label="Target" name="target" defaultValue=".0022" />);
    const box = screen.getByLabelText<HTMLInputElement>("Target");
    expect(box.value).toBe(".0022");
    expect(box.hasAttribute("aria-invalid")).toBe(false);
    expect(box.hasAttribute("aria-describedby")).toBe(false);
  });

  it("may stand on a page twice under one name", () => {
    render(
      <>
        <Field label="Why change" name="reason" defaultValue="one" />
        <Field label="Why decline" name="reason" defaultValue="two" />
      </>,
    );
    expect(screen.getByLabelText<HTMLInputElement>("Why decline").value).toBe("two");
  });
});

describe("a choice", () => {
  it("names its group, ticks what was chosen and says what is wrong", () => {
    render(
      <Choice
        legend="What happened"
        type="checkbox"
        name="events"
        options={[
          { value: "pressure-dip", label: "pressure dip" },
          { value: "over-rev", label: "over-rev" },
        ]}
        defaultValue={["over-rev"]}
        error="Say what happened."
      />,
    );
    const group = screen.getByRole("group", { name: "What happened" });
    expect(document.getElementById(group.getAttribute("aria-describedby")!)?.textContent).toContain(
      "Say what happened.",
    );
    expect(screen.getByLabelText<HTMLInputElement>("over-rev").checked).toBe(true);
    expect(screen.getByLabelText<HTMLInputElement>("pressure dip").checked).toBe(false);
  });
});

const form = (errors: { path: string; message: string }[]) => (
  <>
    <ErrorSummary errors={errors} />
    <Field label="Target" name="target" error={errors.find(({ path }) => path === "target")?.message} />
    <Select label="Oil" name="oil" options={[{ value: "a", label: "Bench forty" }]} />
  </>
);

describe("the list of mistakes", () => {
  it("leads to its field before script: the link's address is the field's", () => {
    const page = document.createElement("div");
    page.innerHTML = renderToStaticMarkup(form([{ path: "target", message: tooWide }]));
    const link = page.querySelector("a")!;
    expect(page.querySelector(link.getAttribute("href")!)?.getAttribute("name")).toBe("target");
  });

  it("takes the focus when it appears, and hands it to a field that is pressed", () => {
    render(form([{ path: "target", message: tooWide }]));
    expect(document.activeElement).toBe(screen.getByRole("alert", { name: "There is a problem" }));
    fireEvent.click(screen.getByRole("link", { name: tooWide }));
    expect(document.activeElement).toBe(screen.getByLabelText("Target"));
  });

  it("finds a field by its name where the mistake is not written beside it", () => {
    render(form([{ path: "oil", message: "Choose the oil." }]));
    fireEvent.click(screen.getByRole("link", { name: "Choose the oil." }));
    expect(document.activeElement).toBe(screen.getByLabelText("Oil"));
  });

  it("leaves the focus alone when the page is only drawn again", () => {
    const { rerender } = render(form([{ path: "target", message: tooWide }]));
    screen.getByLabelText("Oil").focus();
    rerender(form([{ path: "target", message: tooWide }]));
    expect(document.activeElement).toBe(screen.getByLabelText("Oil"));
  });

  it("is not there without a mistake", () => {
    render(form([]));
    expect(screen.queryByRole("alert")).toBeNull();
  });
});
