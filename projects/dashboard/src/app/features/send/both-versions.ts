import { amountToType } from '../../ui/parse-amount';
import { type DraftDocument, keyedPath, pathPart } from './draft-document';
import { fieldName, type ProductName } from './field-words';

/** A field in which the own draft and the job as it is now differ. */
export interface Difference {
  readonly path: string;
  readonly name: string;
  readonly mine: string;
  readonly theirs: string;
}

/** Every field in which two versions of a job differ, with both as they are written. */
export function differences(
  mine: DraftDocument,
  theirs: DraftDocument,
  product: ProductName,
): readonly Difference[] {
  const ours = fieldsOf(mine);
  const others = fieldsOf(theirs);
  return [...new Set([...ours.keys(), ...others.keys()])].flatMap((path) => {
    const [here = '', there = ''] = [ours.get(path), others.get(path)];
    if (here === there) return [];
    const name = fieldName(ours.has(path) ? mine : theirs, path, product);
    return [{ path, name, mine: here || 'nothing', theirs: there || 'nothing' }];
  });
}

/** Every single value of a draft by its path; what the form keeps for itself is none. */
function fieldsOf({ timers: _running, ...document }: DraftDocument): ReadonlyMap<string, string> {
  const fields = new Map<string, string>();
  const walk = (value: unknown, path: string): void => {
    // An item is named by its key; the key says nothing more.
    if (/\/(product|kind|ref)$/.test(path)) return;
    if (typeof value === 'object' && value !== null) {
      for (const [key, each] of Object.entries(value)) walk(each, path + pathPart(key));
    } else if (value !== undefined && value !== null && value !== '') {
      fields.set(keyedPath(document, path), worded(path, value));
    }
  };
  walk(document, '');
  return fields;
}

function worded(path: string, value: unknown): string {
  if (path.endsWith('Cents')) return amountToType(Number(value));
  if (value === true) return 'yes';
  if (value === false) return 'no';
  return String(value).replaceAll('_', ' ');
}
