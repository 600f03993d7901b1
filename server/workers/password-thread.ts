import type { Piscina } from 'piscina';
import { Refusal } from '#shared/domain/refusal';
import type { PasswordWork } from './password-work';
import { startThreads } from './start-threads';

/** 2¹² rounds: about a quarter of a second for a check, in 2026, on the machines this was measured on. */
const COST = 12;
/** bcrypt reads no further (Provos and Mazières, "A Future-Adaptable Password Scheme", 1999). */
const LONGEST_BYTES = 72;
/** Waiting checks; more than this would wait for longer than a person does. */
const LONGEST_QUEUE = 64;

/**
 * Hashes and checks passwords on a thread of its own, so that neither a sign-in holds up other requests nor an export a
 * sign-in. The thread starts with the first password and runs from source and from the build alike.
 */
export class PasswordThread {
  private pool: Piscina<PasswordWork, string | boolean> | undefined;

  constructor(private readonly cost: number = COST) {}

  /** The bcrypt hash to store for a password. */
  async hash(password: string): Promise<string> {
    return (await this.run({
      kind: 'hash',
      password: ready(password),
      cost: this.cost,
    })) as string;
  }

  /** Whether a password belongs to a stored hash; without one it takes as long and says no. */
  async matches(password: string, hash: string | null): Promise<boolean> {
    const text = ready(password);
    const same = await this.run({
      kind: 'compare',
      password: text,
      hash: hash ?? this.nobodysHash(),
    });
    return same === true && hash !== null && Buffer.byteLength(text) <= LONGEST_BYTES;
  }

  async close(): Promise<void> {
    await this.pool?.destroy();
    this.pool = undefined;
  }

  private async run(task: PasswordWork): Promise<string | boolean> {
    this.pool ??= startThreads({ program: 'password-work', atMost: 1, queue: LONGEST_QUEUE });
    if (this.pool.queueSize >= LONGEST_QUEUE) {
      throw new Refusal('too-many', 'Too many people sign in at this moment. Try again.', [], 10);
    }
    return this.pool.run(task);
  }

  /** A well-formed hash of the same cost that no password is known to have. */
  private nobodysHash(): string {
    return `$2b$${String(this.cost).padStart(2, '0')}$${'.'.repeat(53)}`;
  }
}

/** Keyboards compose letters differently; the same password is the same text in NFC. */
function ready(password: string): string {
  return password.normalize('NFC');
}
