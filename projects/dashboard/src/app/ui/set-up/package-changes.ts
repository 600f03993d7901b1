import type { OutOf } from '#shared/contracts/endpoint';
import * as contract from '#shared/contracts/set-up';
import type { Api } from '../../core/api/api';
import type { ChangeOf } from './change-of';
import { textOf, type Typed } from './field';
import { wholeOf } from './read-field';

/** A package as the catalogue has it. */
export type Package = OutOf<typeof contract.putPackage>;

/** Name and warranty of a package; without one, a new package. */
export function packageChange(
  api: Api,
  taken: readonly string[],
  sold?: Package,
): ChangeOf<Package> {
  return {
    label: sold ? `Package ${sold.name}` : 'A new package',
    act: sold ? 'Save the package' : 'Add the package',
    fields: [
      ...(sold
        ? []
        : [
            {
              key: 'code',
              label: 'Code',
              kind: 'packageCode',
              taken,
              hint: 'Small letters, digits and _, as full or top_up. It cannot be changed later.',
            } as const,
          ]),
      { key: 'name', label: 'Name of the package', kind: 'text' },
      {
        key: 'warrantyMonths',
        label: 'Warranty, months',
        kind: 'whole',
        hint: '0 where there is none. Cars already sold keep theirs.',
      },
    ],
    check: (typed): Readonly<Record<string, string>> =>
      Number(textOf(typed, 'warrantyMonths')) > 600
        ? { warrantyMonths: 'At most 600 months.' }
        : {},
    start: { name: sold?.name ?? '', warrantyMonths: sold ? String(sold.warrantyMonths) : '' },
    ...(sold
      ? {
          change: (typed: Typed) => {
            const warrantyMonths = wholeOf(typed, 'warrantyMonths');
            return warrantyMonths === sold.warrantyMonths
              ? undefined
              : { kind: 'warranty' as const, package: sold.code, warrantyMonths };
          },
        }
      : {}),
    save: (typed) =>
      api.call(contract.putPackage, {
        params: { code: sold?.code ?? textOf(typed, 'code') },
        body: { name: textOf(typed, 'name'), warrantyMonths: wholeOf(typed, 'warrantyMonths') },
      }),
  };
}
