/** The id of the control of a form's path; one kit form is open at a time. */
export function fieldId(path: string): string {
  return `kit-${path.replaceAll('.', '-')}`
}
