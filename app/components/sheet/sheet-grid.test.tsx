import { cleanup, fireEvent, render, screen } from "@testing-library/react";
import { afterEach, expect, test } from "vitest";
import { fitKind } from "~/engineering/trade/fit-kinds";
import { readBoxKey, sheetRows, travelOrder } from "./boxes";
import { SheetGrid } from "./sheet-grid";
import { SheetStore } from "./sheet-store";

afterEach(cleanup);

const positions = ["a", "b", "c"].map((letter, index) => ({ id: letter.repeat(32), number: index + 1 }));
const stations = fitKind("main").stations;

function sheet(travel: "position" | "station" = "position") {
  const store = new SheetStore([]);
  render(
    <SheetGrid
      label="Mains"
      positionWord="Main"
      boreWord="bore"
      journalWord="journal"
      unitLabel="in"
      positions={positions}
      stations={stations}
      store={store}
      travel={travel}
      frozen={false}
      readBox={(_box, text) => ({ valuePm: Number(text) })}
      figures={() => ({
        vertical: "–",
        taper: "–",
        outOfRound: "–",
        uncertainty: "",
        window: { word: "", tone: "none" },
      })}
      onActive={() => {}}
    />,
  );
  const boxes = screen.getAllByRole("textbox") as HTMLInputElement[];
  boxes[0]!.focus();
  return { store, boxes };
}

const focused = () => (document.activeElement as HTMLInputElement).getAttribute("aria-label");

/** Types into the box that has the focus, as keys do: what was selected is replaced. */
function type(text: string): void {
  fireEvent.change(document.activeElement as HTMLInputElement, { target: { value: text } });
}

const press = (key: string, options = {}) =>
  fireEvent.keyDown(document.activeElement as Element, { key, ...options });

test("one stop for Tab, and it follows the focus", () => {
  const { boxes } = sheet();
  expect(boxes.filter((box) => box.tabIndex === 0)).toEqual([boxes[0]]);
  press("ArrowDown");
  expect(boxes.filter((box) => box.tabIndex === 0).map((box) => box.getAttribute("aria-label"))).toEqual([
    "Main 2, bore, front 90°",
  ]);
});

test("arrows move one box and do not wrap; Home and End reach the row's ends, with Control the sheet's", () => {
  sheet();
  press("ArrowLeft");
  expect(focused()).toBe("Main 1, bore, front 90°");
  press("ArrowRight");
  expect(focused()).toBe("Main 1, bore, front +45°");
  press("ArrowUp");
  expect(focused()).toBe("Main 1, bore, front +45°");
  press("End");
  expect(focused()).toBe("Main 1, journal, rear B");
  press("ArrowRight");
  expect(focused()).toBe("Main 1, journal, rear B");
  press("End", { ctrlKey: true });
  expect(focused()).toBe("Main 3, journal, rear B");
  press("Home", { ctrlKey: true });
  expect(focused()).toBe("Main 1, bore, front 90°");
  press("PageDown");
  expect(focused()).toBe("Main 3, bore, front 90°");
});

test("Enter commits and walks on, along a part or through the parts; Shift+Enter walks back", () => {
  const { store, boxes } = sheet();
  type("2.4521");
  press("Enter");
  expect(store.box(boxes[0]!.name)).toMatchObject({ text: "2.4521", status: "waiting" });
  expect(focused()).toBe("Main 1, bore, front +45°");
  press("Enter", { shiftKey: true });
  expect(focused()).toBe("Main 1, bore, front 90°");
  cleanup();
  sheet("station");
  press("Enter");
  expect(focused()).toBe("Main 2, bore, front 90°");
});

test("Escape restores what stood there; F2 lets the arrows move inside the text", () => {
  const { store, boxes } = sheet();
  type("2.4521");
  press("Enter");
  press("Enter", { shiftKey: true });
  type("9");
  press("Escape");
  expect(boxes[0]!.value).toBe("2.4521");
  press("F2");
  press("ArrowRight");
  expect(focused()).toBe("Main 1, bore, front 90°");
  press("F2");
  press("ArrowRight");
  expect(focused()).toBe("Main 1, bore, front +45°");
  expect(store.box(boxes[0]!.name).text).toBe("2.4521");
});

test("Control+Z takes back across boxes, latest first", () => {
  const { store, boxes } = sheet();
  type("1");
  press("Enter");
  type("2");
  press("Enter");
  press("z", { ctrlKey: true });
  expect(store.box(boxes[1]!.name).text).toBe("");
  expect(focused()).toBe("Main 1, bore, front +45°");
  press("z", { ctrlKey: true });
  expect(store.box(boxes[0]!.name).text).toBe("");
});

test("every box is told apart by its name, and read back from it", () => {
  const rows = sheetRows(positions, stations);
  const keys = rows.flat().map((box) => box.key);
  expect(new Set(keys).size).toBe(30);
  expect(readBoxKey(keys[0]!)).toEqual({ positionId: "a".repeat(32), station: stations[0] });
  expect(readBoxKey("fit")).toBeUndefined();
  expect(readBoxKey(`${"z".repeat(32)}.bore.front.a`)).toBeUndefined();
  expect(
    travelOrder(rows, "station")
      .map((box) => box.key)
      .sort(),
  ).toEqual([...keys].sort());
});
