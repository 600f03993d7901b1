import { formatInstant } from '../../ui/format';

/** What the server said, with its instants in the reader's own time. */
export function refusalSentence(sentence: string): string {
  return sentence.replace(/\d{4}-\d\d-\d\dT\d\d:\d\d:[\d.]+Z/g, (instant) =>
    formatInstant(instant),
  );
}
