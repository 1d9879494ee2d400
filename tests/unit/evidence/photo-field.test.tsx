import { cleanup, render, screen, within } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { useState } from "react";
import { afterEach, expect, it } from "vitest";
import { PhotoField } from "@/components/evidence/photo-field";
import { PhotoStrip } from "@/components/evidence/photo-strip";
import type { PhotoView } from "@/lib/evidence/types";

const MOVE = `mov_${"0".repeat(28)}`;

const aView = (given: Partial<PhotoView> = {}): PhotoView => ({
  id: `pho_${"0".repeat(28)}`, moveId: MOVE, state: "kept", pending: false, refusedWhy: null, name: "R4 tread.jpg", type: "image/jpeg", sizeBytes: 3_400_000, sha256: "ab".repeat(32),
  widthPx: 4000, heightPx: 3000, capturedAt: "2026-11-24T20:05:33.000Z", camera: "Ardell P4", place: null, takenBy: "V. Sorrel", takenByCompany: "Quillan & Sandbar",
  at: "2026-11-24T20:06:00.000Z", zone: "America/Chicago", previewUrl: "/preview", originalUrl: "/original", ...given,
});

function Form({ start = [], error = null }: { start?: PhotoView[]; error?: string | null }) {
  const [photos, setPhotos] = useState(start);
  return (
    <>
      <PhotoField moveId={MOVE} label="Photos of the wheel" hint="The whole tread." value={photos} onChange={setPhotos} error={error} />
      <output>{photos.map(({ id }) => id).join()}</output>
    </>
  );
}

afterEach(async () => {
  for (const button of screen.queryAllByRole("button", { name: /^(Remove|Cancel)/ })) await userEvent.click(button);
  cleanup();
});

it("says in words why a file can't be taken, and lets it be removed", async () => {
  render(<Form />);
  const input = screen.getByLabelText("Choose photos");
  const heic = new Uint8Array([0, 0, 0, 0x24, ...new TextEncoder().encode("ftypheic\0\0\0\0mif1heic")]);
  await userEvent.upload(input, [new File([heic], "IMG_1.jpg", { type: "image/jpeg" }), new File(["<svg/>"], "x.png", { type: "image/png" }), new File([], "none.jpg", { type: "image/jpeg" })]);
  expect(await screen.findByText("This phone saves HEIC pictures that this browser can’t open. Set the camera to Most compatible or choose a JPEG.")).toBeDefined();
  expect(await screen.findByText("This is not a JPEG, PNG or WebP picture.")).toBeDefined();
  expect(await screen.findByText("The file is empty.")).toBeDefined();
  await userEvent.click(screen.getByRole("button", { name: "Remove x.png" }));
  expect(screen.queryByText("x.png")).toBeNull();
});

it("is one group with its label, hint and error", () => {
  render(<Form error="This item needs a photo." />);
  const group = screen.getByRole("group", { name: "Photos of the wheel" });
  const described = (group.getAttribute("aria-describedby") ?? "").split(" ").map((id) => document.getElementById(id)?.textContent);
  expect(described).toEqual(["The whole tread.", "This item needs a photo."]);
});

it("shows a photo that the form has, and what is pending, in words", async () => {
  render(<Form start={[aView({ state: "proof", pending: true, originalUrl: null })]} />);
  const group = screen.getByRole("group", { name: "Photos of the wheel" });
  expect(within(group).getByRole("img", { name: "Photo R4 tread.jpg, taken by V. Sorrel, Quillan & Sandbar" })).toBeDefined();
  expect(within(group).getByText("Original pending")).toBeDefined();
  await userEvent.click(within(group).getByRole("button", { name: "Remove R4 tread.jpg" }));
  expect(screen.getByRole("status", { name: "" }).textContent).toBe("");
});

it("opens a photo big, with what is known of it and the way to its original", async () => {
  render(<PhotoStrip photos={[aView(), aView({ id: "pho_2", name: "late.jpg", state: "proof", pending: true, originalUrl: null, capturedAt: null, camera: null })]} />);
  expect(screen.getByText("Original pending")).toBeDefined();
  await userEvent.click(screen.getByRole("button", { name: /R4 tread/ }));
  const dialog = screen.getByRole("dialog", { name: "R4 tread.jpg" });
  expect(within(dialog).getByText("24 Nov 2026 14:05 CST")).toBeDefined();
  expect(within(dialog).getByText("Ardell P4")).toBeDefined();
  expect(within(dialog).getByText("abababababababab…").getAttribute("title")).toBe("ab".repeat(32));
  expect(within(dialog).getByRole("link", { name: "Original, 3.2 MB, 4000 × 3000 pixels" }).getAttribute("href")).toBe("/original");
  await userEvent.click(within(dialog).getByRole("button", { name: "Close" }));
  await userEvent.click(screen.getByRole("button", { name: /late/ }));
  expect(within(screen.getByRole("dialog", { name: "late.jpg" })).queryByRole("link")).toBeNull();
});

it("tells a refused original from one that is pending", () => {
  render(<PhotoStrip photos={[aView({ state: "refused", refusedWhy: "Its SHA-256 differs.", originalUrl: null })]} />);
  expect(screen.getByText("Original refused")).toBeDefined();
});
