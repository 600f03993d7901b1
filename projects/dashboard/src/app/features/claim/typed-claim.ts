import type * as z from 'zod';
import type { claimContent, getClaim } from '#shared/contracts/claims';
import type { OutOf } from '#shared/contracts/endpoint';
import { CLAIM_CAUSES, CLAIM_DECISIONS, type Role, SIDES, ZONES } from '#shared/domain/vocabulary';
import type { TypedClaim } from '../../core/drafts/claim-draft';
import { amountToType, parseAmount } from '../../ui/parse-amount';
import { proposeReference } from './claim-reference';

/** A claim as it goes out. */
export type ClaimBody = z.input<typeof claimContent>;
/** A claim as it is read. */
export type ReadClaim = OutOf<typeof getClaim>;
/** What is wrong with a field as typed. */
export type TypedProblems = Partial<Record<keyof TypedClaim, string>>;

/** The form of a new claim. */
export function emptyClaim(today: string): TypedClaim {
  return {
    claimRef: proposeReference(today),
    madeOn: today,
    zone: '',
    side: '',
    cause: '',
    labourMinutes: '',
    productMl: '',
    cost: '',
    decision: 'open',
    decidedOn: '',
    paidOn: '',
    note: '',
  };
}

/** A claim on record as its form holds it; what is proposed to head office stands as the decision. */
export function typedOf(claim: ReadClaim): TypedClaim {
  return {
    claimRef: claim.claimRef,
    madeOn: claim.madeOn,
    zone: claim.zone,
    side: claim.side ?? '',
    cause: claim.cause,
    labourMinutes: claim.labourMinutes > 0 ? String(claim.labourMinutes) : '',
    productMl: claim.productMl > 0 ? String(claim.productMl) : '',
    cost: claim.costCents ? amountToType(claim.costCents) : '',
    decision: claim.proposedDecision ?? claim.decision,
    decidedOn: claim.decidedOn ?? '',
    paidOn: claim.paidOn ?? '',
    note: claim.note ?? '',
  };
}

/** What was typed as it goes out, or what is wrong with it; money only from those who see it (rule 24). */
export function claimBody(
  typed: TypedClaim,
  jobRef: string,
  role: Role,
): { readonly body: ClaimBody } | { readonly problems: TypedProblems } {
  const zone = ZONES.find((one) => one === typed.zone);
  const side = SIDES.find((one) => one === typed.side);
  const cause = CLAIM_CAUSES.find((one) => one === typed.cause);
  const decision = CLAIM_DECISIONS.find((one) => one === typed.decision) ?? 'open';
  const labourMinutes = wholeOf(typed.labourMinutes);
  const productMl = wholeOf(typed.productMl);
  const costCents = typed.cost.trim() === '' ? 0 : parseAmount(typed.cost);
  const problems: TypedProblems = {
    ...(typed.claimRef.trim() === '' && { claimRef: 'A claim has a reference.' }),
    ...(typed.madeOn === '' && { madeOn: 'A claim is made on a day.' }),
    ...(zone === undefined && { zone: 'Touch the car where it is, or choose from the list.' }),
    ...(cause === undefined && { cause: 'Choose why; it can be corrected later.' }),
    ...(labourMinutes === undefined && { labourMinutes: 'Whole minutes, such as 90.' }),
    ...(productMl === undefined && { productMl: 'Whole millilitres, such as 500.' }),
    ...(role !== 'recorder' &&
      costCents === undefined && { cost: 'Write the amount as 120 or 120.50.' }),
  };
  if (Object.keys(problems).length > 0 || zone === undefined || cause === undefined) {
    return { problems };
  }
  const decided = decision !== 'open';
  return {
    body: {
      jobRef,
      madeOn: typed.madeOn,
      zone,
      ...(side && { side }),
      cause,
      decision,
      ...(decided && typed.decidedOn && { decidedOn: typed.decidedOn }),
      labourMinutes: labourMinutes ?? 0,
      productMl: productMl ?? 0,
      ...(role !== 'recorder' && { costCents: costCents ?? 0 }),
      ...(decided && typed.paidOn && { paidOn: typed.paidOn }),
      ...(typed.note.trim() && { note: typed.note.trim() }),
    },
  };
}

/** The cost as typed, where it is an amount. */
export function typedCost(typed: Pick<TypedClaim, 'cost'>): number | undefined {
  return typed.cost.trim() === '' ? 0 : parseAmount(typed.cost);
}

function wholeOf(text: string): number | undefined {
  const plain = text.replace(/[\s\u00a0\u202f]/g, '');
  if (plain === '') return 0;
  return /^\d{1,7}$/.test(plain) ? Number(plain) : undefined;
}
