/** The path of a Chromium on this machine: CHROME, then the search path, then usual places; undefined when there is none. */
export function findChromium(
  env?: Readonly<Record<string, string | undefined>>,
  places?: readonly string[],
): string | undefined;

/** Whether a missing browser can be installed here without asking anyone: Debian, as root. */
export function canInstallChromium(release?: string, user?: number): boolean;
