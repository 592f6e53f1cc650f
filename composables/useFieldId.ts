/** The element id of the field that holds a value, from the value's path in the form: what an error's link jumps to. */
export function fieldId(path: string): string {
  return `field-${path.replace(/[^A-Za-z0-9]+/g, '-')}`
}
