import { describe, expect, it } from "vitest";
import { safeNext } from "@/lib/viewer/next-path";

describe("the path to go to after sign-in", () => {
  it.each(["/moves", "/moves/mov_0193/findings?visit=isp_1", "/account", "/moves?q=sand&stage=moving"])("keeps %s", (path) => {
    expect(safeNext(path)).toBe(path);
  });

  it.each([
    "//e.example", "///e.example", "/\\e.example", "\\\\e.example", "\\/e.example", "/%5ce.example", "/%5C%5Ce.example", "/%2fe.example", "/%2F%2Fe.example", "/a//e.example", "https:e.example", "https://e.example", "http:/e.example", "HTTPS://e.example",
    "javascript:alert(1)", "data:text/html,x", "e.example", "@e.example", "/\te.example", "/\t/e.example", "/%09/e.example", "/\ne.example", "/\r\nLocation: https://e.example", "/%0d%0aLocation:%20x", "/%0a", " /moves", "", "/ /e.example",
    "/\u0000", "/%00", "/é", "/api/v1/moves", "/<script>", "/\u2028x", "?next=//e", "#x", ".//e.example", "/..//e.example",
  ])("refuses %j", (path) => {
    expect(safeNext(path)).toBeNull();
  });

  it("stays on our own host whatever it lets through", () => {
    for (const path of ["/@e.example", "/e.example", "/:80", "/;//e", "/.", "/..", "/%2e%2e"]) {
      const next = safeNext(path);
      if (next !== null) expect(new URL(next, "https://ours.example").host).toBe("ours.example");
    }
  });
});
