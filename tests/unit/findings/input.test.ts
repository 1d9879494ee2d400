import { expect, it } from "vitest";
import { postFindingInput } from "@/lib/findings/input";

const ID = (kind: string) => `${kind}_${"0".repeat(28)}`;

it("an empty form comes back once, with everything that is missing", () => {
  const empty = { moveId: ID("mov"), inspectionId: ID("isp"), componentId: "knuckle", placeId: "", placeNote: "", observed: "", reading: "", condition: "", severity: "", photoIds: [], noPhotoReason: "", enteredFor: null };
  const fields = postFindingInput.safeParse(empty).error?.issues.map(({ path }) => path.join("."));
  expect(fields?.sort()).toEqual(["observed", "photoIds", "placeId", "severity"]);
  expect(postFindingInput.safeParse({ ...empty, componentId: "register", observed: "Not in the register.", severity: "note", noPhotoReason: "Nothing to see" }).success).toBe(true);
});

it("takes no fields that it does not know", () => {
  const path = postFindingInput.safeParse({ state: "cleared" }).error?.issues.find(({ code }) => code === "unrecognized_keys");
  expect(path).toMatchObject({ keys: ["state"] });
});
