import type { Role } from '#shared/domain/vocabulary';
import { formatCount } from './format';

/** What is looked at, read after "in": "Havnsund", "your 6 branches", "the network’s 16 branches", "3 branches". */
export function whereWords(
  codes: readonly string[],
  all: number,
  role: Role | undefined,
  branchName: (code: string) => string,
): string {
  const [only] = codes;
  if (codes.length === 1 && only !== undefined) return branchName(only);
  const counted = `${formatCount(codes.length)} branches`;
  if (codes.length < all) return counted;
  return role === 'head_office' ? `the network’s ${counted}` : `your ${counted}`;
}
