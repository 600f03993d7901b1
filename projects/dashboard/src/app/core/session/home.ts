import type { Role } from '#shared/domain/vocabulary';

/** The first page of a role. */
export function homeOf(role: Role | undefined): string {
  return role === 'recorder' ? '/send' : '/this-week';
}
