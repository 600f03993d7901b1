import { branchDefinitions } from './branch-definitions';
import { comeBackDefinitions } from './come-back-definitions';
import type { Definition, DefinitionGroup } from './definition';
import { labourDefinitions } from './labour-definitions';
import { moneyDefinitions } from './money-definitions';
import { productDefinitions } from './product-definitions';
import { quoteDefinitions } from './quote-definitions';
import { readingDefinitions } from './reading-definitions';
import { rotDefinitions } from './rot-definitions';
import { signalDefinitions } from './signal-definitions';
import { warrantyDefinitions } from './warranty-definitions';
import { weeklyDefinitions } from './weekly-definitions';

/** Every figure shown so far, in the order in which the page tells them. A new figure adds its definition to one of these groups. */
export const DEFINITION_GROUPS: readonly DefinitionGroup[] = [
  { id: 'money', title: 'Money', definitions: moneyDefinitions },
  { id: 'weekly', title: 'The weekly chart', definitions: weeklyDefinitions },
  { id: 'labour', title: 'Labour overrun', definitions: labourDefinitions },
  { id: 'rot-found', title: 'Rot', definitions: rotDefinitions },
  { id: 'product', title: 'Product', definitions: productDefinitions },
  { id: 'warranty', title: 'Warranty', definitions: warrantyDefinitions },
  { id: 'branches', title: 'Comparing branches', definitions: branchDefinitions },
  { id: 'noticing', title: 'Noticing in time', definitions: signalDefinitions },
  { id: 'come-backs', title: 'Left on cars', definitions: comeBackDefinitions },
  { id: 'quotes', title: 'The next car', definitions: quoteDefinitions },
  { id: 'reading', title: 'What counts, and how it is shown', definitions: readingDefinitions },
];

/** All of them in one list. */
export const DEFINITIONS: readonly Definition[] = DEFINITION_GROUPS.flatMap(
  ({ definitions }) => definitions,
);
