/** Numbers of rules that a text cites: "rule n", "rules n, m and o", "rules n–m", also across a comment's line break. */
export function citedRules(text: string): number[] {
  const gap = String.raw`[\s*/]+`;
  const joint = String.raw`(?:,${gap}(?:and${gap})?|${gap}(?:and|or|to)${gap}|[–-])`;
  const cited = new RegExp(String.raw`\brules?${gap}(\d+(?:${joint}\d+)*)\b`, 'gi');
  return [...text.matchAll(cited)]
    .flatMap(([, numbers]) => numbers?.match(/\d+/g) ?? [])
    .map(Number);
}
