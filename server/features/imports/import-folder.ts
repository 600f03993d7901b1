import { existsSync, mkdirSync, readdirSync, renameSync, rmSync } from 'node:fs';
import { join } from 'node:path';

/** Where the bytes of sent files lie: each as `<id>.csv`, its refused rows beside it. */
export class ImportFolder {
  constructor(private readonly folder: string) {}

  fileOf(id: string): string {
    return join(this.folder, `${id}.csv`);
  }

  refusedOf(id: string): string {
    return join(this.folder, `${id}.refused.jsonl`);
  }

  has(id: string): boolean {
    return existsSync(this.fileOf(id));
  }

  /** Takes a received file in. */
  take(id: string, from: string): void {
    mkdirSync(this.folder, { recursive: true });
    renameSync(from, this.fileOf(id));
  }

  /** Removes everything but the files of some ids. */
  keepOnly(ids: ReadonlySet<string>): void {
    if (!existsSync(this.folder)) return;
    for (const name of readdirSync(this.folder)) {
      if (!ids.has(name.split('.')[0] ?? '')) rmSync(join(this.folder, name), { force: true });
    }
  }
}
