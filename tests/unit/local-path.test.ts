import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { localPath } from "@/app/(public)/sign-in/local-path";

describe("the path to return to after signing in", () => {
  it.each(["/rigs", "/rigs/a/songs/b?paper=letter#lead-2", "/", "/rigs/%E2%82%AC"])("keeps %s", (from) => {
    expect(localPath(from)).toBe(from);
  });

  it.each([
    "https://elsewhere.example/", "//elsewhere.example", "/\\elsewhere.example", "\\\\elsewhere.example", "/\t/elsewhere.example", "/\n/elsewhere.example",
    "/\r\n\\elsewhere.example", "/.//elsewhere.example", "/rigs/..//elsewhere.example", "/%2e//elsewhere.example", " //elsewhere.example",
    "javascript:alert(1)", "rigs", "", undefined, ["/rigs", "/account"],
  ])("refuses %j", (from) => {
    expect(localPath(from)).toBeNull();
  });

  it("never leads off this site, whatever was asked", () => {
    const here = "https://rig.example";
    const hostile = fc.array(fc.constantFrom("/", "\\", "\t", "\n", "\r", ".", "..", "%2e", "@", ":", "?", "#", "elsewhere.example", " "), { maxLength: 10 });
    fc.assert(fc.property(hostile, (parts) => {
      const path = localPath(`/${parts.join("")}`);
      if (path !== null) expect(new URL(path, here).origin).toBe(here);
    }), { numRuns: 5000, seed: 7 });
  });
});
