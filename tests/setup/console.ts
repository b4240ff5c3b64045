import { format } from "node:util";
import { afterEach } from "vitest";

/** An error that the code under test printed and nobody looked at fails the test. */
const printed: string[] = [];
const original = console.error;
console.error = (...args: unknown[]) => {
  printed.push(format(...args));
  original(...args);
};

afterEach(() => {
  const lines = printed.splice(0);
  if (lines.length > 0) {
    throw new Error(
      `console.error was called. A test that expects this replaces it with vi.spyOn.\n${lines.join("\n")}`,
    );
  }
});
