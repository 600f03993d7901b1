/** The branch that a page is about: the one in the URL, or the only one there is; `undefined` when it must be chosen. */
export function branchOf(
  asked: string | readonly string[] | undefined,
  branches: readonly { readonly code: string }[],
): string | undefined {
  const words = asked === undefined ? [] : typeof asked === 'string' ? [asked] : asked;
  const known = branches.filter(({ code }) => words.includes(code));
  if (known.length === 1) return known[0]?.code;
  return branches.length === 1 ? branches[0]?.code : undefined;
}
