import type { ConsoleMessage, Page } from 'playwright-core';

/** What went wrong on a page since it was last asked. */
export interface Troubles {
  /** Hands over what went wrong and forgets it. */
  taken: () => string[];
  /** Names something that is meant to be refused, so that the browser's own line about it is no trouble. */
  expect: (refused: RegExp) => void;
}

/**
 * Collects what a page's console calls an error (breaches of the content security policy are among them) and scripts that
 * failed. The one request that is refused by design is left out: asking for a sign-in to go on with before there is any.
 */
export function troublesOf(page: Page): Troubles {
  const troubles: string[] = [];
  const expected: RegExp[] = [];
  const note = (text: string): void => {
    if (!expected.some((one) => one.test(text))) troubles.push(text);
  };
  page.on('console', (message) => {
    if (message.type() === 'error' && !isResumeRefused(message)) note(wordsOf(message));
  });
  page.on('pageerror', (error) => note(`a script failed: ${error.stack ?? error.message}`));
  return { taken: () => troubles.splice(0), expect: (refused) => void expected.push(refused) };
}

function isResumeRefused(message: ConsoleMessage): boolean {
  return / 401 /.test(message.text()) && message.location().url.endsWith('/api/auth/refresh');
}

function wordsOf(message: ConsoleMessage): string {
  return `${message.text()} (${message.location().url})`;
}
