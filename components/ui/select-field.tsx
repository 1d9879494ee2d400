import { type ComponentProps } from "react";
import { describeField, FieldFrame, type FieldProps } from "./field";

export type Choice = { value: string; label: string; disabled?: boolean };
export type ChoiceGroup = { group: string; choices: readonly Choice[] };

export type SelectFieldProps = FieldProps & Omit<ComponentProps<"select">, keyof FieldProps | "children"> & {
  choices: readonly (Choice | ChoiceGroup)[];
  /** The words of the first line, which stands for no answer; leave out where every answer is a real one. */
  blank?: string;
};

function Option({ value, label, disabled }: Choice) {
  return (
    <option value={value} disabled={disabled}>
      {label}
    </option>
  );
}

/** The lines of a native select, grouped where a choice is a group. */
export function Options({ choices, blank }: Pick<SelectFieldProps, "choices" | "blank">) {
  return (
    <>
      {blank !== undefined && <option value="">{blank}</option>}
      {choices.map((choice) =>
        "group" in choice ? (
          <optgroup key={choice.group} label={choice.group}>
            {choice.choices.map((inner) => (
              <Option key={inner.value} {...inner} />
            ))}
          </optgroup>
        ) : (
          <Option key={choice.value} {...choice} />
        ),
      )}
    </>
  );
}

/** One of a list, in a native select. */
export function SelectField({ label, hint, error, required, className, choices, blank, ...props }: SelectFieldProps) {
  const described = describeField({ id: props.id, name: props.name, hint, error });
  return (
    <FieldFrame id={described.id} {...{ label, hint, error, required, className }}>
      <select {...props} {...described} required={required} className="field-box">
        <Options choices={choices} blank={blank} />
      </select>
    </FieldFrame>
  );
}
