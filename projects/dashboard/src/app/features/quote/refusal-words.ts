import type { FieldProblem } from '#shared/contracts/fields';

const PARTS: Readonly<Record<string, string>> = {
  make: 'Make',
  model: 'Model',
  firstRegistered: 'First registered',
  bodyType: 'Body type',
  package: 'Package',
  branch: 'Branch',
};

const TOO_HIGH =
  'The margin asked for and the network fee leave nothing of the price to pay for the work. Ask for less.';

/** Why a question was not taken, by its parts as the form names them. */
export function refusalWords(fields: readonly FieldProblem[]): string {
  const said = fields.map(({ path, message }) => {
    const name = path.split('/').at(-1) ?? '';
    if (name === 'marginShare') return TOO_HIGH;
    const part = PARTS[name];
    return part ? `${part}: ${message}.` : `${message}.`;
  });
  return said.length > 0 ? said.join(' ') : 'This question cannot be answered as it is.';
}
