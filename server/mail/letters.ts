import { escaped, oneLine } from './plain-line';

/** A mail ready to be queued. */
export interface Mail {
  to: string;
  subject: string;
  text: string;
  html: string;
}

/** Who a letter goes to. */
export interface Addressee {
  email: string;
  name: string;
}

/** The letter that invites a person to choose their first password. */
export function invitationLetter(to: Addressee, link: string): Mail {
  return letter(to, 'Your sign-in for Underseam', link, {
    opening: 'An account was made for you in Underseam.',
    asking: 'Choose your password here; the link works once, for 7 days:',
    closing: 'If you did not expect this, you need do nothing.',
  });
}

/** The letter that lets a person choose a new password. */
export function resetLetter(to: Addressee, link: string): Mail {
  return letter(to, 'A new password for Underseam', link, {
    opening: 'Somebody, probably you, asked for a new password for your Underseam account.',
    asking: 'Choose it here; the link works once, for 1 hour:',
    closing: 'If it was not you, you need do nothing: your password stays as it is.',
  });
}

/** Where and when something was done with an account. */
export interface Occasion {
  /** ISO instant. */
  at: string;
  address: string;
  device: string;
}

/** The letter that tells of a sign-in from a device that was not seen before. */
export function newSignInLetter(
  to: Addressee,
  { at, address, device }: Occasion,
  link: string,
): Mail {
  const from = device === '' ? 'a device that does not say what it is' : oneLine(device);
  return letter(to, 'A new sign-in to Underseam', link, {
    opening: `Somebody, probably you, signed in to your Underseam account on ${told(at)} from a device that was not seen before: ${from}, network address ${oneLine(address)}.`,
    asking: 'If it was not you, sign out everywhere and choose another password here:',
    closing:
      'If it was you, you need do nothing. Which mails you receive is said on the same page.',
  });
}

/** The letter that tells that the password was changed. */
export function passwordChangedLetter(
  to: Addressee,
  { at, address }: Omit<Occasion, 'device'>,
  link: string,
): Mail {
  return letter(to, 'Your password for Underseam was changed', link, {
    opening: `The password of your Underseam account was changed on ${told(at)} from the network address ${oneLine(address)}.`,
    asking: 'If it was not you, ask for a new password here at once and tell head office:',
    closing: 'If it was you, you need do nothing.',
  });
}

/** How the writing of a file ended. */
export interface EndedImport {
  branch: string;
  fileName: string;
  /** In words: `written`, `stopped by Ansa Moor`, `failed: the disk is full`. */
  outcome: string;
  /** In words: `12 new`, `3 refused`. */
  counts: readonly string[];
  /** Path of the page that shows it. */
  path: string;
}

/** The letter that tells that a file was written, or that its writing ended otherwise. */
export function importEndedLetter(to: Addressee, ended: EndedImport, link: string): Mail {
  const counts = ended.counts.length > 0 ? ` ${ended.counts.join(', ')}.` : '';
  return letter(to, 'A file was worked through in Underseam', link, {
    opening: oneLine(`The file ${ended.fileName} of ${ended.branch}: ${ended.outcome}.${counts}`),
    asking: 'What was written and what was refused stands here:',
    closing: 'Which mails you receive is said on your own page.',
  });
}

/** The letter that tells that the report of a month was issued; its figures stay behind the sign-in. */
export function warrantyReportLetter(to: Addressee, asOf: string, link: string): Mail {
  return letter(to, 'The warranty report of the month in Underseam', link, {
    opening: `The warranty-risk report as of ${asOf} was issued and is kept unchanged.`,
    asking: 'Read it here, signed in:',
    closing: 'Who is told of it is set by head office; which mails you receive, on your own page.',
  });
}

/** An instant as a letter says it: to the minute, and of which clock. */
function told(at: string): string {
  return `${at.slice(0, 10)} at ${at.slice(11, 16)} UTC`;
}

interface Sentences {
  opening: string;
  asking: string;
  closing: string;
}

function letter(to: Addressee, subject: string, link: string, say: Sentences): Mail {
  const greeting = `Hello ${oneLine(to.name)},`;
  const paragraphs = [greeting, say.opening, say.asking, link, say.closing];
  const html = paragraphs.map((text) =>
    text === link
      ? `<p><a href="${escaped(link)}">${escaped(link)}</a></p>`
      : `<p>${escaped(text)}</p>`,
  );
  return {
    to: to.email,
    subject,
    text: `${paragraphs.join('\n\n')}\n`,
    html: `<!doctype html><html lang="en"><meta charset="utf-8"><title>${escaped(subject)}</title><body>${html.join('')}</body></html>`,
  };
}
