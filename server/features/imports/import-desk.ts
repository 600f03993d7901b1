/** Checks and writes the files that branches send, one at a time. */
export class ImportDesk {
  /** Stops what is under way; what is written stays. */
  async close(): Promise<void> {}
}
