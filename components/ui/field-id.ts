/** The id of the control that posts under this name; the list of errors links to it. */
export function fieldId(name: string): string {
  return `field-${name.replaceAll(/[^\w-]/g, "-")}`;
}
