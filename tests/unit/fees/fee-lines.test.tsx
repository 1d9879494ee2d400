import { render, screen } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { useState } from "react";
import { expect, it } from "vitest";
import { FeeLines, type TypedLine } from "@/components/fees/fee-lines";

function Bench() {
  const [lines, setLines] = useState<TypedLine[]>([{ row: 0, kind: "line-haul", description: "", amount: "" }]);
  return <FeeLines lines={lines} onChange={setLines} onAdd={() => setLines([...lines, { row: lines.length, kind: "", description: "", amount: "" }])} errorOf={(name) => (name === "lines.1.amount" ? "Enter an amount." : null)} />;
}

it("adds what can be read, says what can’t, and keeps the other line when one goes", async () => {
  const user = userEvent.setup();
  render(<Bench />);
  await user.click(screen.getByRole("button", { name: "Add a line" }));
  const [first, second] = screen.getAllByLabelText(/^Amount/) as [HTMLElement, HTMLElement];
  await user.type(first, "4,185.00");
  await user.type(second, "0,5");
  expect(screen.getByText("$4,185.00")).toBeTruthy();
  expect(screen.getByText(/without one amount that can’t be read yet/)).toBeTruthy();
  expect(second.getAttribute("aria-invalid")).toBe("true");
  await user.clear(second);
  await user.type(second, "0.50");
  expect(screen.getByText("$4,185.50")).toBeTruthy();
  await user.click(screen.getByRole("button", { name: "Remove line 1" }));
  expect(screen.getAllByLabelText(/^Amount/).map((field) => (field as HTMLInputElement).value)).toEqual(["0.50"]);
  expect(screen.queryByRole("button", { name: /Remove/ })).toBeNull();
});
