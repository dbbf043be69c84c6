import { expect, test } from "vitest";
import { SheetStore } from "./sheet-store";

const value = (text: string) => ({ text, valuePm: 1, error: undefined, warning: undefined });

test("what is typed while a batch is on its way waits for the next one, over the reading that the first one made", () => {
  const store = new SheetStore([]);
  store.commit("a", value("1"));
  expect(store.takeQueue(50)).toEqual([{ key: "a", typed: "1", supersedes: null }]);
  store.commit("a", value("2"));
  store.commit("b", value("3"));
  expect(store.takeQueue(50).map(({ key }) => key)).toEqual(["b"]);
  expect(store.waiting).toBe(3);
  store.settle("a", { readingId: "reading-1" });
  expect(store.box("a").status).toBe("waiting");
  expect(store.takeQueue(50)).toEqual([{ key: "a", typed: "2", supersedes: "reading-1" }]);
  store.settle("a", { readingId: "reading-2" });
  store.settle("b", { readingId: "reading-3" });
  expect(store.waiting).toBe(0);
  expect(store.box("a")).toMatchObject({ status: "saved", readingId: "reading-2" });
});

test("a batch without an answer goes back to the head of the queue, and nothing newer is lost", () => {
  const store = new SheetStore([]);
  store.commit("a", value("1"));
  store.commit("b", value("2"));
  const sent = store.takeQueue(50);
  store.commit("a", value("1 again"));
  store.commit("c", value("3"));
  store.returnToQueue(sent);
  expect(store.takeQueue(50).map(({ key, typed }) => `${key} ${typed}`)).toEqual(["b 2", "a 1 again", "c 3"]);
});

test("a box with an error is not sent, and says so until it is mended", () => {
  const store = new SheetStore([]);
  store.commit("a", { text: "x", valuePm: null, error: "no number", warning: undefined });
  expect(store.takeQueue(50)).toEqual([]);
  expect(store.box("a").status).toBe("refused");
  store.commit("a", value("2"));
  expect(store.takeQueue(50)).toHaveLength(1);
});
