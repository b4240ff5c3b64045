import { afterEach, beforeEach, describe, expect, test, vi } from "vitest";
import { act, cleanup, fireEvent, render, screen } from "@testing-library/react";
import { SessionEndWarning } from "@/components/frame/session-end-warning";

const MINUTE = 60_000;
const answer = vi.fn<() => Promise<Response>>();
const signedIn = async () => Response.json({ idleEndsAt: "2026-12-01T12:10:00.000Z" });

beforeEach(() => {
  vi.useFakeTimers();
  answer.mockReset().mockImplementation(signedIn);
  vi.stubGlobal("fetch", answer);
});

afterEach(() => {
  cleanup();
  vi.useRealTimers();
  vi.unstubAllGlobals();
});

function open() {
  render(
    <SessionEndWarning signInHref="/sign-in" warnAfterMs={28 * MINUTE} endsAfterMs={30 * MINUTE} />,
  );
}

const wait = (minutes: number) => act(() => vi.advanceTimersByTimeAsync(minutes * MINUTE));

describe("the end of a session", () => {
  test("is announced two minutes before and not earlier", async () => {
    open();
    await wait(27.9);
    expect(screen.queryByRole("dialog")).toBeNull();
    await wait(0.2);
    expect(screen.getByRole("dialog", { name: "Stay signed in?" }).textContent).toContain(
      "signed out in 2 minutes",
    );
  });

  test("is put off by Stay signed in", async () => {
    open();
    await wait(29);
    await act(async () => fireEvent.click(screen.getByRole("button", { name: "Stay signed in" })));
    await wait(5);
    expect(answer).toHaveBeenCalledOnce();
    expect(screen.queryByRole("dialog")).toBeNull();
  });

  test("is put off by use of the page, asked for at most once a minute", async () => {
    open();
    await wait(27);
    await act(async () => fireEvent.keyDown(window, { key: "a" }));
    await act(async () => fireEvent.keyDown(window, { key: "b" }));
    await wait(20);
    expect(answer).toHaveBeenCalledOnce();
    expect(screen.queryByRole("dialog")).toBeNull();
  });

  test("is told when it has come, with a way to sign in that leaves the page as it is", async () => {
    open();
    await wait(31);
    expect(screen.getByRole("dialog", { name: "You are signed out" })).toBeTruthy();
    const link = screen.getByRole("link", { name: "Sign in in a new window" });
    expect(link.getAttribute("target")).toBe("_blank");
  });

  test("is told at once when the answer is that nobody is signed in", async () => {
    answer.mockImplementation(async () => new Response(null, { status: 401 }));
    open();
    await wait(29);
    await act(async () => fireEvent.click(screen.getByRole("button", { name: "Stay signed in" })));
    expect(screen.getByRole("dialog", { name: "You are signed out" })).toBeTruthy();
  });

  test("without an answer the question stays and says that nothing is lost", async () => {
    answer.mockImplementation(async () => {
      throw new TypeError("Failed to fetch");
    });
    open();
    await wait(29);
    await act(async () => fireEvent.click(screen.getByRole("button", { name: "Stay signed in" })));
    expect(screen.getByRole("dialog", { name: "Stay signed in?" }).textContent).toContain(
      "There was no answer. What you typed is kept",
    );
  });
});
