import { createTransport, type SendMailOptions, type Transporter } from 'nodemailer';
import { holdBackEnd, type HeldMail } from './hold-back-end';
import type { WaitingMail } from '#db/queries/mails';
import type { Config } from '../config';

/** What went wrong with a mail: a short code to keep, and whether trying again can help. */
export interface SendingFailure {
  code: string;
  lasting: boolean;
}

/** A connection to the server of SMTP_URL. A mail may name no file or address to fetch from. */
export function makeTransport(smtpUrl: string): Transporter {
  const transport = createTransport({
    url: smtpUrl,
    connectionTimeout: 10_000,
    greetingTimeout: 10_000,
    socketTimeout: 30_000,
    disableFileAccess: true,
    disableUrlAccess: true,
  });
  transport.use('stream', holdBackEnd);
  return transport;
}

/** A mail as nodemailer takes it; the Message-ID stays the same however often it is tried. */
export function messageOf(
  mail: WaitingMail,
  config: Pick<Config, 'smtpUrl' | 'publicUrl'>,
  beforeEnd: () => Promise<void>,
): SendMailOptions & HeldMail {
  const cancelling = new AbortController();
  const host = new URL(config.publicUrl).hostname;
  return {
    from: { name: 'Underseam', address: senderOf(config.smtpUrl, host) },
    to: { name: '', address: mail.recipient },
    subject: mail.subject,
    text: mail.text,
    ...(mail.html !== null && { html: mail.html }),
    messageId: `<${mail.id}.${Date.parse(mail.createdAt)}@${host}>`,
    date: new Date(mail.createdAt),
    headers: { 'Auto-Submitted': 'auto-generated', ...stopHeaders(mail, config.publicUrl) },
    beforeEnd,
    cancelling,
    signal: cancelling.signal,
  };
}

/**
 * How a mail program stops mails of this kind: the link of the page (RFC 2369), and that posting to it does so in one click,
 * which holds for https only (RFC 8058, 3.1). A mail server that signs must sign these two headers as well (RFC 8058, 4).
 */
function stopHeaders(
  { unsubscribe }: WaitingMail,
  publicUrl: string,
): Record<string, string | { prepared: true; value: string }> {
  if (unsubscribe === null) return {};
  const address = stopLink(publicUrl, unsubscribe);
  return {
    // Prepared, because a folded address would be read with a space in it.
    'List-Unsubscribe': { prepared: true, value: `<${address}>` },
    ...(address.startsWith('https:') && {
      'List-Unsubscribe-Post': 'List-Unsubscribe=One-Click',
    }),
  };
}

/** Address of the page that stops a kind of mail; posting to it does so without asking. */
export function stopLink(publicUrl: string, token: string): string {
  return `${publicUrl.replace(/\/+$/, '')}/unsubscribe?token=${encodeURIComponent(token)}`;
}

/** The SMTP user when that is an address, since many servers let a user send only as themselves. */
function senderOf(smtpUrl: string | undefined, host: string): string {
  const user = smtpUrl === undefined ? '' : decodeURIComponent(new URL(smtpUrl).username);
  return user.includes('@') ? user : `underseam@${host}`;
}

/**
 * Reads a sending error. A 5yz answer to the recipient or the message is lasting (RFC 5321, 4.2.1); anything else (a server
 * that is away, a wrong password in the settings) may be put right. The server's own words are not kept.
 */
export function failureOf(error: unknown): SendingFailure {
  const { code, responseCode } = (error ?? {}) as { code?: unknown; responseCode?: unknown };
  const name = typeof code === 'string' ? code : 'EUNKNOWN';
  const answer = typeof responseCode === 'number' ? responseCode : undefined;
  return {
    code: answer === undefined ? name : `${name} ${answer}`,
    lasting: answer !== undefined && answer >= 500 && (name === 'EENVELOPE' || name === 'EMESSAGE'),
  };
}
