import type { Role } from '#shared/domain/vocabulary';

/** The first page of a role. */
export function homeOf(role: Role | undefined): string {
  if (role === 'recorder') return '/send';
  if (role === 'regional_lead') return '/branches';
  return role === 'head_office' ? '/warranty' : '/this-week';
}
