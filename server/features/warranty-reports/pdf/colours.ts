/** Colours of the printed report: paper is light, and what is told apart by colour is told apart by shape or word too. */
export const COLOURS = {
  ink: '#1e2a2f',
  quiet: '#55646b',
  hairline: '#d9d4c8',
  oxide: '#8c3a22',
  amber: '#b8770f',
  tide: '#1f6a6a',
  zinc: '#6b7c84',
} as const;
