import type { DevicePhoto } from './device-draft';

/** What stands in the form of a claim; empty text where nothing is given yet. */
export interface TypedClaim {
  readonly claimRef: string;
  readonly madeOn: string;
  readonly zone: string;
  readonly side: string;
  readonly cause: string;
  readonly labourMinutes: string;
  readonly productMl: string;
  readonly cost: string;
  readonly decision: string;
  readonly decidedOn: string;
  readonly paidOn: string;
  readonly note: string;
}

/** A photo of a claim on this device. */
export type ClaimDevicePhoto = Omit<DevicePhoto, 'finding'>;

/** Bodies that went out under a reference and were not answered: one of them may be there. */
export interface TriedClaim {
  readonly claimRef: string;
  readonly bodies: readonly string[];
}

/** A claim as written on this device, one a job and person; kept until the server has it with its photos. */
export interface ClaimDraft {
  readonly personId: number;
  readonly branch: string;
  readonly jobRef: string;
  readonly typed: TypedClaim;
  readonly photos: readonly ClaimDevicePhoto[];
  readonly tried?: TriedClaim;
  /** The reference under which the server has it; photos may still be here. */
  readonly sentAs?: string;
  /** ISO instant. */
  readonly changedAt: string;
}

/** What a form changes of a draft; `undefined` takes a field away. */
export interface ClaimDraftChange {
  readonly typed?: TypedClaim;
  readonly tried?: TriedClaim | undefined;
  readonly sentAs?: string;
}
