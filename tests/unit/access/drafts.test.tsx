import { render, screen } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { afterEach, expect, it } from "vitest";
import { forgetDrafts, useDraft } from "@/components/access/drafts";

function Form({ name }: { name: string }) {
  const { value, change, forget, restored } = useDraft(name, { text: "" });
  return (
    <>
      <input aria-label="Text" value={value.text} onChange={(event) => change({ text: event.target.value })} />
      <button type="button" onClick={forget}>Sent</button>
      {restored && <p>Kept</p>}
    </>
  );
}

afterEach(() => sessionStorage.clear());

const typed = () => screen.getByLabelText<HTMLInputElement>("Text").value;

it("what was typed is there again after a reload, for the same person only", async () => {
  const first = render(<Form name="answer:usr_1:fnd_1" />);
  await userEvent.type(screen.getByLabelText("Text"), "New knuckle");
  first.unmount();
  const again = render(<Form name="answer:usr_1:fnd_1" />);
  expect(typed()).toBe("New knuckle");
  expect(screen.getByText("Kept")).toBeTruthy();
  again.unmount();
  render(<Form name="answer:usr_2:fnd_1" />);
  expect(typed()).toBe("");
});

it("is gone once it was sent, and with signing out, and nothing else goes with it", async () => {
  sessionStorage.setItem("other", "stays");
  const first = render(<Form name="a" />);
  await userEvent.type(screen.getByLabelText("Text"), "x");
  await userEvent.click(screen.getByText("Sent"));
  expect(typed()).toBe("");
  await userEvent.type(screen.getByLabelText("Text"), "y");
  first.unmount();
  forgetDrafts();
  render(<Form name="a" />);
  expect(typed()).toBe("");
  expect(sessionStorage.getItem("other")).toBe("stays");
});

it("a draft that can't be read is as none", () => {
  sessionStorage.setItem("towfolio-draft:a", "{not json");
  render(<Form name="a" />);
  expect(typed()).toBe("");
});
