import type {
  Action,
  BodyType,
  Check,
  CheckAnswer,
  Condition,
  ConsumableKind,
  Side,
  Stage,
  Zone,
} from './vocabulary';

export type StageMinutes = Partial<Record<Stage, number>>;

/** A finding as stored: its reference is always there. */
export interface RecordedFinding {
  ref: string;
  zone: Zone;
  side: Side;
  seenAs: Condition;
  workedAs?: Condition;
  structural: boolean;
  action: Action;
  repairMinutes?: number;
  chargedCents?: number;
  note?: string;
}

/**
 * A completed job as the record keeps it. Absent and default are one: a missing number is 0, a missing list empty, a missing
 * text "", except where 0 says something else than "not known" (temperature, odometer, unit cost).
 */
export interface RecordedJob {
  vehicle: {
    key?: string;
    make: string;
    model: string;
    bodyType: BodyType;
    firstRegistered: string;
    odometerKm?: number;
  };
  package: string;
  bookedOn?: string;
  startedOn?: string;
  completedOn: string;
  estimate?: { priceCents: number; stages: StageMinutes };
  agreedExtras?: { on: string; minutes?: number; priceCents?: number; note?: string }[];
  actual: { stages: StageMinutes };
  products?: { product: string; ml: number }[];
  consumables?: { kind: ConsumableKind; quantity: number; unitCostCents?: number }[];
  boughtInCents?: number;
  findings?: RecordedFinding[];
  checks?: Partial<Record<Check, CheckAnswer>>;
  workshop?: { temperatureC?: number; humidityPct?: number };
  invoice?: { number?: string; issuedOn?: string; totalCents: number };
  notes?: string;
}

/** Rot is a finding seen or worked as bubbling or holed; surface rust alone is not. */
export function isRot(finding: Pick<RecordedFinding, 'seenAs' | 'workedAs'>): boolean {
  return finding.seenAs !== 'surface' || (finding.workedAs ?? 'surface') !== 'surface';
}

/** Make and model as compared (rule 33): NFC, trimmed, inner spaces collapsed, case folded. */
export function modelKey(make: string, model: string): string {
  return `${folded(make)}\u001f${folded(model)}`;
}

/** One text folded for comparing without regard to case or spacing. */
export function folded(text: string): string {
  // Nearly all names are plain words, and every job has several: nothing to collapse, nothing to compose.
  if (/^[!-~]+(?: [!-~]+)*$/.test(text)) return text.toLowerCase();
  return text.normalize('NFC').trim().replace(/\s+/gu, ' ').toLowerCase();
}
