/** A photo to be shown: where its bytes come from, and what it is. */
export interface ShownPhoto {
  readonly id: string;
  /** "Photo 1 of sill, inner, left". */
  readonly alt: string;
  /** `whole` for the large one. */
  readonly load: (size: 'small' | 'whole') => Promise<Blob | undefined>;
  /** Words about it that must be seen: "waiting to be sent". */
  readonly state?: string;
  readonly removable: boolean;
}
