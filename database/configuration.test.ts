import { expect, test } from "vitest";
import { readConfiguration } from "./configuration";

test("the demo needs nothing set", () => {
  expect(readConfiguration({ DEMO: "1" })).toMatchObject({
    port: 3000,
    host: "127.0.0.1",
    dataDirectory: "./data",
  });
});

test("an installation without its secret does not start", () => {
  expect(() => readConfiguration({})).toThrow(/SESSION_SECRET is missing/);
});

test("each mistake is named", () => {
  const attempt = () =>
    readConfiguration({ DEMO: "1", PORT: "http", BASE_URL: "shop.example.test", SESSION_SECRET: "short" });
  expect(attempt).toThrow(/PORT/);
  expect(attempt).toThrow(/BASE_URL/);
  expect(attempt).toThrow(/SESSION_SECRET: must have at least 32 characters/);
});
