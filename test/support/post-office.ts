import type { AddressInfo } from 'node:net';
import { SMTPServer } from 'smtp-server';

/** Where a mail stands when the one who sends it may be ended. */
export type MailMoment = 'recipient' | 'data' | 'whole' | 'answered';

/** A real SMTP server on loopback that counts what it has taken, and can hold its answers back. */
export class PostOffice {
  /** Message-IDs in the order they were taken whole. */
  readonly taken: string[] = [];
  /** The mails taken whole, as they came. */
  readonly texts: string[] = [];
  /** Called at each moment of each mail; what it returns is waited for. */
  at: (moment: MailMoment) => Promise<void> | void = () => undefined;
  private readonly server: SMTPServer;

  constructor() {
    this.server = new SMTPServer({
      disabledCommands: ['AUTH', 'STARTTLS'],
      closeTimeout: 100,
      onRcptTo: (_address, _session, done) => {
        void Promise.resolve(this.at('recipient')).then(() => done());
      },
      onData: (stream, _session, done) => {
        const pieces: Buffer[] = [];
        void this.at('data');
        stream.on('data', (piece: Buffer) => pieces.push(piece));
        stream.on('end', () => {
          const text = Buffer.concat(pieces).toString('utf8');
          this.texts.push(text);
          this.taken.push(/^Message-ID: (.*)$/im.exec(text)?.[1]?.trim() ?? '');
          void Promise.resolve(this.at('whole')).then(() => {
            done();
            void this.at('answered');
          });
        });
      },
    });
    // A sender that is killed breaks its connection.
    this.server.on('error', () => undefined);
  }

  async open(): Promise<number> {
    await new Promise<void>((resolve) => this.server.listen(0, '127.0.0.1', resolve));
    return (this.server.server.address() as AddressInfo).port;
  }

  close(): Promise<void> {
    return new Promise((resolve) => this.server.close(() => resolve()));
  }
}
