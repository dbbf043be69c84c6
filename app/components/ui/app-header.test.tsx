import { cleanup, fireEvent, render, screen } from "@testing-library/react";
import { createMemoryRouter, RouterProvider } from "react-router";
import { afterEach, describe, expect, it } from "vitest";
import { AppHeader } from "./app-header";
import { Page } from "./page";

afterEach(cleanup);

function show(units: "inch" | "metric", path = "/engines/12?tab=fits") {
  const page = (
    <>
      <AppHeader
        links={[
          { to: "/", label: "Bench" },
          { to: "/engines", label: "Engines" },
        ]}
        units={units}
        personName="The builder"
        roleName="builder"
        shopName="The shop"
      />
      <Page title="Engine 12" breadcrumbs={[{ to: "/engines", label: "Engines" }]}>
        matter
      </Page>
    </>
  );
  const router = createMemoryRouter([{ path: "*", element: page }], { initialEntries: [path] });
  return render(<RouterProvider router={router} />);
}

describe("the head of every page", () => {
  it("marks the area that the page lies in, and no other", () => {
    show("inch");
    const areas = screen.getByRole("navigation", { name: "Tenthbook" });
    const current = [...areas.querySelectorAll("[aria-current=page]")].map((link) => link.textContent);
    expect(current).toEqual(["Engines"]);
  });

  it.each([
    ["inch", "metric", /Units: inches/],
    ["metric", "inch", /Units: micrometres/],
  ] as const)("shows %s and offers %s, and comes back to the same page", (units, other, name) => {
    const { container } = show(units);
    const button = screen.getByRole<HTMLButtonElement>("button", { name });
    expect(button.value).toBe(other);
    expect(button.getAttribute("aria-label")).toContain("thou · µm");
    expect(container.querySelector<HTMLInputElement>("input[name=back]")?.value).toBe("/engines/12?tab=fits");
  });

  it("keeps account and sign-out in a menu that Escape closes", () => {
    const { container } = show("inch");
    const menu = container.querySelector("details")!;
    menu.open = true;
    screen.getByRole("link", { name: "Your account" }).focus();
    fireEvent.keyDown(menu, { key: "Escape" });
    expect(menu.open).toBe(false);
    expect(document.activeElement).toBe(menu.querySelector("summary"));
    expect(screen.getByText("Sign out").closest("form")?.getAttribute("action")).toBe("/sign-out");
  });

  it("lets who goes by key skip to the page itself", () => {
    show("inch");
    const skip = screen.getByRole("link", { name: "Skip to the page" });
    expect(document.querySelector(skip.getAttribute("href")!)?.tagName).toBe("MAIN");
  });
});
