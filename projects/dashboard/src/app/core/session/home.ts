import type { Role } from '#shared/domain/vocabulary';

/** The first page of a role. */
export function homeOf(role: Role | undefined): string {
  if (role === 'recorder') return '/send';
  return role === 'head_office' ? '/warranty' : '/this-week';
}
