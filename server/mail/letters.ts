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

/** A name as part of a line: nothing in it may start a line, or turn around what follows. */
function oneLine(text: string): string {
  return text
    .replace(/[\p{Cc}\p{Cs}\p{Zl}\p{Zp}\u061c\u200e\u200f\u202a-\u202e\u2066-\u2069]+/gu, ' ')
    .replace(/ {2,}/g, ' ')
    .trim();
}

function escaped(text: string): string {
  const entities: Record<string, string> = {
    '&': '&amp;',
    '<': '&lt;',
    '>': '&gt;',
    '"': '&quot;',
    "'": '&#39;',
  };
  return text.replace(/[&<>"']/g, (character) => entities[character] ?? character);
}
