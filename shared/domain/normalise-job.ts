import type { RecordedFinding, RecordedJob, StageMinutes } from './recorded-job';
import { CHECKS, STAGES } from './vocabulary';

/** A job as a contract hands it over: findings may lack a reference, an invoice its total, and defaults may be written out. */
export type SentJob = Omit<RecordedJob, 'findings' | 'invoice'> & {
  findings?: (Omit<RecordedFinding, 'ref'> & { ref?: string })[];
  invoice?: { number?: string; issuedOn?: string; totalCents?: number } | null;
};

/**
 * The one form in which a job is kept and compared (rule 25): NFC text, keys in one order, defaults left out, every finding
 * with its reference. Two bodies that mean the same become the same text under `JSON.stringify`, which leaves out what is
 * undefined here; nothing is deleted, because a deleted key makes an object slow to write.
 */
export function normaliseJob(sent: SentJob & { invoice?: RecordedJob['invoice'] }): RecordedJob {
  return {
    vehicle: {
      key: text(sent.vehicle.key),
      make: spoken(sent.vehicle.make),
      model: spoken(sent.vehicle.model),
      bodyType: sent.vehicle.bodyType,
      firstRegistered: sent.vehicle.firstRegistered,
      odometerKm: sent.vehicle.odometerKm,
    },
    package: sent.package,
    bookedOn: sent.bookedOn,
    startedOn: sent.startedOn,
    completedOn: sent.completedOn,
    estimate: sent.estimate && {
      priceCents: sent.estimate.priceCents,
      stages: stages(sent.estimate.stages),
    },
    agreedExtras: list(sent.agreedExtras, (extra) => ({
      on: extra.on,
      minutes: extra.minutes || undefined,
      priceCents: extra.priceCents || undefined,
      note: text(extra.note),
    })),
    actual: { stages: stages(sent.actual.stages) },
    products: list(sent.products, ({ product, ml }) => ({ product, ml })),
    consumables: list(sent.consumables, ({ kind, quantity, unitCostCents }) => ({
      kind,
      quantity,
      unitCostCents,
    })),
    boughtInCents: sent.boughtInCents || undefined,
    findings: list(referenced(sent.findings ?? []), (finding) => ({
      ref: finding.ref,
      zone: finding.zone,
      side: finding.side,
      seenAs: finding.seenAs,
      workedAs: finding.workedAs,
      structural: finding.structural,
      action: finding.action,
      repairMinutes: finding.repairMinutes || undefined,
      chargedCents: finding.chargedCents || undefined,
      note: text(finding.note),
    })),
    checks: checks(sent.checks),
    workshop: workshop(sent.workshop),
    invoice: sent.invoice && {
      number: text(sent.invoice.number),
      issuedOn: sent.invoice.issuedOn,
      totalCents: sent.invoice.totalCents,
    },
    notes: text(sent.notes),
  };
}

/** A recorded job as it is answered: with its lists and numbers even where they are empty or 0. */
export type WrittenOutJob = Omit<RecordedJob, 'agreedExtras'> & {
  agreedExtras: { on: string; minutes: number; priceCents?: number; note?: string }[];
};

/** A recorded job with its defaults written out. */
export function writtenOut(job: RecordedJob): WrittenOutJob {
  return {
    ...job,
    ...(job.estimate && {
      estimate: { priceCents: job.estimate.priceCents, stages: allStages(job.estimate.stages) },
    }),
    agreedExtras: (job.agreedExtras ?? []).map((extra) => ({
      minutes: 0,
      priceCents: 0,
      ...extra,
    })),
    actual: { stages: allStages(job.actual.stages) },
    products: job.products ?? [],
    consumables: job.consumables ?? [],
    boughtInCents: job.boughtInCents ?? 0,
    findings: (job.findings ?? []).map((finding) => ({
      repairMinutes: 0,
      chargedCents: 0,
      ...finding,
    })),
    notes: job.notes ?? '',
  };
}

/** Gives every finding a reference: its own, or `zone/side/n` counted in the order sent (rule 71), passing over ones already taken. */
export function referenced(
  findings: readonly (Omit<RecordedFinding, 'ref'> & { ref?: string })[],
): RecordedFinding[] {
  const taken = new Set(findings.flatMap((finding) => finding.ref?.normalize('NFC') ?? []));
  return findings.map((finding) => {
    if (finding.ref !== undefined) return { ...finding, ref: finding.ref.normalize('NFC') };
    let n = 1;
    while (taken.has(`${finding.zone}/${finding.side}/${n}`)) n += 1;
    const ref = `${finding.zone}/${finding.side}/${n}`;
    taken.add(ref);
    return { ...finding, ref };
  });
}

/** Make and model as shown: NFC, trimmed, inner spaces collapsed; spelling kept. */
function spoken(value: string): string {
  if (/^[!-~]+(?: [!-~]+)*$/.test(value)) return value;
  return value.normalize('NFC').trim().replace(/\s+/gu, ' ');
}

function text(value: string | undefined): string | undefined {
  return value ? value.normalize('NFC') : undefined;
}

function stages(minutes: StageMinutes): StageMinutes {
  const kept: StageMinutes = {};
  for (const stage of STAGES) if (minutes[stage]) kept[stage] = minutes[stage];
  return kept;
}

function checks(sent: RecordedJob['checks']): RecordedJob['checks'] {
  if (!sent) return undefined;
  const kept: NonNullable<RecordedJob['checks']> = {};
  let any = false;
  for (const check of CHECKS) {
    if (!sent[check]) continue;
    kept[check] = sent[check];
    any = true;
  }
  return any ? kept : undefined;
}

function workshop(sent: RecordedJob['workshop']): RecordedJob['workshop'] {
  if (sent?.temperatureC === undefined && sent?.humidityPct === undefined) return undefined;
  return { temperatureC: sent.temperatureC, humidityPct: sent.humidityPct };
}

function allStages(minutes: StageMinutes): StageMinutes {
  return Object.fromEntries(STAGES.map((stage) => [stage, minutes[stage] ?? 0]));
}

function list<From, To>(
  items: readonly From[] | undefined,
  map: (item: From) => To,
): To[] | undefined {
  return items && items.length > 0 ? items.map(map) : undefined;
}
