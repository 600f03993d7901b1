import type { FieldProblem } from '#shared/contracts/fields';
import { pointerPart } from '#shared/contracts/read-problems';
import { ROLES, type Role } from '#shared/domain/vocabulary';

/** The codes that a person can be given. */
export interface Places {
  regions: ReadonlySet<string>;
  branches: ReadonlySet<string>;
}

const NEEDS: Record<Role, keyof Places | 'nothing'> = {
  recorder: 'branches',
  site_manager: 'branches',
  regional_lead: 'regions',
  head_office: 'nothing',
};
const SPOKEN: Record<Role, string> = {
  recorder: 'a recorder',
  site_manager: 'a site manager',
  regional_lead: 'a regional lead',
  head_office: 'head office',
};
const ONE = { regions: 'region', branches: 'branch' } as const;

/** What is wrong with where a person is placed (rule 65), read from a body that may have any shape (rule 57). */
export function checkPlacing(raw: unknown, known: Places): FieldProblem[] {
  const sent = (typeof raw === 'object' && raw !== null ? raw : {}) as Record<string, unknown>;
  return (['regions', 'branches'] as const).flatMap((field) => {
    const codes = listOf(sent[field]);
    return codes
      ? [...checkNeed(sent['role'], field, codes), ...checkCodes(field, codes, known)]
      : [];
  });
}

function checkNeed(role: unknown, field: keyof Places, codes: readonly unknown[]): FieldProblem[] {
  const asked = ROLES.find((one) => one === role);
  if (!asked) return [];
  const path = pointerPart(field);
  if (NEEDS[asked] === field) {
    return codes.length > 0
      ? []
      : [{ path, message: `${SPOKEN[asked]} needs at least one ${ONE[field]}` }];
  }
  if (codes.length === 0) return [];
  return asked === 'head_office'
    ? [{ path, message: 'head office sees the whole network and is given nothing here' }]
    : [{ path, message: `${SPOKEN[asked]} is given no ${field}, only ${NEEDS[asked]}` }];
}

function checkCodes(field: keyof Places, codes: readonly unknown[], known: Places): FieldProblem[] {
  return codes.flatMap((code, at) =>
    typeof code !== 'string' || known[field].has(code)
      ? []
      : [
          {
            path: pointerPart(field) + pointerPart(at),
            message: `there is no ${ONE[field]} with the code ${JSON.stringify(code.slice(0, 64))}`,
          },
        ],
  );
}

/** Absent is the empty list; what is no list is the contract's to tell. */
function listOf(value: unknown): readonly unknown[] | undefined {
  if (value === undefined) return [];
  return Array.isArray(value) ? value : undefined;
}
