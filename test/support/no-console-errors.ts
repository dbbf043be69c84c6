import { afterEach, beforeEach, expect, vi } from "vitest";

// A test that logs an error it did not announce has failed, whatever it asserted.
let errors: ReturnType<typeof vi.spyOn>;

beforeEach(() => {
  errors = vi.spyOn(console, "error");
});

afterEach(() => {
  const unexpected = errors.mock.calls;
  errors.mockRestore();
  expect(unexpected, "unexpected console.error").toEqual([]);
});
