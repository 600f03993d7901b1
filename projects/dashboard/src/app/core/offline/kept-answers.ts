import { addDays, daysBetween } from '#shared/domain/calendar';

/** An answer as it came, and on which day of this device. */
interface KeptAnswer {
  readonly at: string;
  readonly body: unknown;
}

const PREFIX = 'underseam.kept.';
/** Enough for the cars of some weeks; the oldest goes first. */
const MOST = 60;

/** Keeps an answer for the person it was given to. */
export function keepAnswer(personId: number, url: string, body: unknown, now: Date): void {
  try {
    const kept: KeptAnswer = { at: now.toISOString(), body };
    localStorage.setItem(placeOf(personId, url), JSON.stringify(kept));
    const places = keptPlaces();
    if (places.length <= MOST) return;
    const oldest = places.sort((a, b) => (keptAt(a) < keptAt(b) ? -1 : 1))[0];
    if (oldest !== undefined) localStorage.removeItem(oldest);
  } catch {
    // Storage is full or switched off: without a line there is then nothing to show.
  }
}

/** The answer last given to a person at an address, its `today` moved on by the days that have passed on this device. */
export function keptAnswer(personId: number, url: string, now: Date): unknown {
  try {
    const text = localStorage.getItem(placeOf(personId, url));
    if (text === null) return undefined;
    const { at, body } = JSON.parse(text) as KeptAnswer;
    if (typeof body !== 'object' || body === null || !('today' in body)) return body;
    const passed = daysBetween(localDay(new Date(at)), localDay(now));
    return { ...body, today: addDays(body.today as string, Math.max(0, passed)) };
  } catch {
    return undefined;
  }
}

/** Forgets every answer kept on this device. */
export function forgetAnswers(): void {
  try {
    for (const place of keptPlaces()) localStorage.removeItem(place);
  } catch {
    // Storage is switched off: nothing was kept.
  }
}

function keptPlaces(): string[] {
  return Object.keys(localStorage).filter((key) => key.startsWith(PREFIX));
}

function keptAt(place: string): string {
  return (JSON.parse(localStorage.getItem(place) ?? '{"at":""}') as KeptAnswer).at;
}

function placeOf(personId: number, url: string): string {
  return `${PREFIX}${personId}.${url}`;
}

function localDay(date: Date): string {
  const two = (value: number): string => String(value).padStart(2, '0');
  return `${date.getFullYear()}-${two(date.getMonth() + 1)}-${two(date.getDate())}`;
}
