import { COLOURS } from './colours';
import type { Paper } from './paper';
import { paragraph } from './paragraph';

/** Height that what a heading stands over needs at least, so that no heading stays alone at the foot of a page. */
const FOLLOWING = 96;

/** A section begins: its name and, quieter, what is meant in one breath. */
export function heading(paper: Paper, name: string, method = '', following = FOLLOWING): void {
  paper.room(following + (method === '' ? 36 : 62));
  if (paper.y > 60) paper.y += 14;
  paragraph(paper, [{ text: name, size: 13, weight: 600 }], 'H2');
  if (method !== '') quietly(paper, method);
  paper.y += 4;
}

/** A sentence of explanation. */
export function quietly(paper: Paper, text: string): void {
  paragraph(paper, [{ text, size: 9, colour: COLOURS.quiet }]);
}
