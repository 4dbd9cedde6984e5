import { afterEach, beforeEach, expect, vi } from "vitest";

// An unexpected console.error is a failed test: it is where frameworks whisper what is wrong.
beforeEach(() => {
  vi.spyOn(console, "error");
});
afterEach(() => {
  expect(vi.mocked(console.error).mock.calls).toEqual([]);
  vi.mocked(console.error).mockRestore();
});
