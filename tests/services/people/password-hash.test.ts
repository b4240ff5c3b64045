import { describe, expect, it } from "vitest";
import { hashPassword, verifyPassword } from "@/lib/auth/password";

const PASSWORD = "four words in a row";

describe("how passwords are kept", () => {
  it("is Argon2id with 19 MiB, 2 passes and 1 lane", async () => {
    // OWASP Password Storage Cheat Sheet, Argon2id: m=19456 (19 MiB), t=2, p=1 (from memory).
    expect(await hashPassword(PASSWORD)).toMatch(
      /^\$argon2id\$v=19\$m=19456,t=2,p=1\$[A-Za-z0-9+/]{22}\$[A-Za-z0-9+/]{43}$/,
    );
  });

  it("has a salt of its own for each", async () => {
    expect(await hashPassword(PASSWORD)).not.toBe(await hashPassword(PASSWORD));
  });

  it("knows the right one and no other", async () => {
    const kept = await hashPassword(PASSWORD);
    expect(await verifyPassword(kept, PASSWORD)).toBe(true);
    for (const wrong of ["", PASSWORD.toUpperCase(), `${PASSWORD} `, `${PASSWORD}\u0000`, kept]) {
      expect([wrong, await verifyPassword(kept, wrong)]).toEqual([wrong, false]);
    }
  });

  it("reads long ones and foreign letters to the end", async () => {
    const long = "x".repeat(199);
    const kept = await hashPassword(`${long}a`);
    expect(await verifyPassword(kept, `${long}b`)).toBe(false);
    const foreign = await hashPassword("軸が折れた理由は疲労です🪛");
    expect(await verifyPassword(foreign, "軸が折れた理由は疲労です🪛")).toBe(true);
    expect(await verifyPassword(foreign, "軸が折れた理由は疲労です🔧")).toBe(false);
  });

  it("works as long for an account without a password, and says no", async () => {
    const kept = await hashPassword(PASSWORD);
    expect(await verifyPassword(null, PASSWORD)).toBe(false);
    const spent = async (hash: string | null) => {
      const times = [];
      for (let i = 0; i < 5; i += 1) {
        const begun = performance.now();
        await verifyPassword(hash, "wrong");
        times.push(performance.now() - begun);
      }
      return Math.min(...times);
    };
    // The least of five, so that a busy machine does not decide; without the work it is near 0.
    expect(await spent(null)).toBeGreaterThan((await spent(kept)) / 4);
  });
});
