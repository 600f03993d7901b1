/** The names along a JSON pointer (RFC 6901), `~1` and `~0` read back as `/` and `~`. */
export function pointerNames(path: string): readonly string[] {
  return path
    .replace(/^\//, '')
    .split('/')
    .filter((name) => name !== '')
    .map((name) => name.replaceAll('~1', '/').replaceAll('~0', '~'));
}
