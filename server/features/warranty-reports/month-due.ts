import { addDays, addMonths } from '#shared/domain/calendar';

/** Of which month the report is due on a day, and as of which day it is. */
export interface DueMonth {
  /** `2026-02` */
  month: string;
  /** The last day of the month before. */
  asOf: string;
}

/** Whether a day of the month has been reached, and of what month the report then is. */
export function monthDue(today: string, dayOfMonth: number): DueMonth | undefined {
  if (Number(today.slice(8)) < dayOfMonth) return undefined;
  return { month: today.slice(0, 7), asOf: addDays(`${today.slice(0, 7)}-01`, -1) };
}

/** The day on which it is due next: of this month (today, when that day has gone by) unless this month's is done. */
export function nextDue(today: string, dayOfMonth: number, doneMonth: string | undefined): string {
  const month = today.slice(0, 7);
  const day = String(dayOfMonth).padStart(2, '0');
  if (doneMonth === undefined || doneMonth < month) {
    const due = `${month}-${day}`;
    return due < today ? today : due;
  }
  return `${addMonths(`${doneMonth}-01`, 1).slice(0, 7)}-${day}`;
}
