import { PasswordThread } from './password-thread';

describe('PasswordThread', () => {
  const thread = new PasswordThread(4);
  afterAll(() => thread.close());

  it('given the password a hash was made of, says that it matches', async () => {
    const hash = await thread.hash('mud and wax 1234');
    expect(hash).toMatch(/^\$2b\$04\$.{53}$/);
    expect(await thread.matches('mud and wax 1234', hash)).toBe(true);
    expect(await thread.matches('mud and wax 1235', hash)).toBe(false);
  });

  it('given the same letters composed otherwise, says that they match', async () => {
    const hash = await thread.hash('Tür im Schweller'.normalize('NFD'));
    expect(await thread.matches('Tür im Schweller'.normalize('NFC'), hash)).toBe(true);
  });

  it('given no hash, takes the work of a check and says no', async () => {
    const slow = new PasswordThread(10);
    try {
      const hash = await slow.hash('mud and wax 1234');
      // Time on a core, all threads of this process together: a busy machine makes none of it longer.
      const work = async (stored: string | null) => {
        const before = process.cpuUsage();
        expect(await slow.matches('something else 99', stored)).toBe(false);
        return process.cpuUsage(before).user;
      };
      const rounds = 7;
      const known: number[] = [];
      const unknown: number[] = [];
      for (let round = 0; round < rounds; round += 1) {
        known.push(await work(hash));
        unknown.push(await work(null));
      }
      const least = (works: number[]) => Math.min(...works);
      expect(least(unknown)).toBeGreaterThan(least(known) * 0.5);
      expect(least(unknown)).toBeLessThan(least(known) * 2);
    } finally {
      await slow.close();
    }
  });

  it('given more than bcrypt reads, refuses what only begins alike', async () => {
    const seventyTwo = 'a'.repeat(72);
    const hash = await thread.hash(seventyTwo);
    expect(await thread.matches(seventyTwo, hash)).toBe(true);
    expect(await thread.matches(`${seventyTwo}b`, hash)).toBe(false);
  });

  it('while it works, leaves the event loop free', async () => {
    const slow = new PasswordThread(12);
    try {
      await slow.hash('warm the thread up');
      let turns = 0;
      const turning = setInterval(() => (turns += 1), 5);
      await slow.hash('mud and wax 1234');
      clearInterval(turning);
      expect(turns).toBeGreaterThan(5);
    } finally {
      await slow.close();
    }
  });

  it('when too many wait, refuses instead of letting people wait', async () => {
    const busy = new PasswordThread(8);
    try {
      const asked = Array.from({ length: 90 }, () => busy.matches('x', null));
      const answers = await Promise.allSettled(asked);
      const refused = answers.filter(({ status }) => status === 'rejected');
      expect(refused.length).toBeGreaterThan(0);
      expect(refused.length).toBeLessThan(30);
      expect(refused[0]).toMatchObject({ reason: { kind: 'too-many', retryAfterSeconds: 10 } });
    } finally {
      await busy.close();
    }
  });

  it('when closed before any use, has nothing to close', async () => {
    await expect(new PasswordThread().close()).resolves.toBeUndefined();
  });
});
