/** Text that a spreadsheet would run as a formula gets an apostrophe in front. Source of the list: OWASP, "CSV Injection". */
export function defused(text: string): string {
  return /^[=+\-@\t\r]/.test(text) ? `'${text}` : text;
}
