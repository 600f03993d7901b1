import type { RotAnswer, RotBand } from '#shared/contracts/rot';
import { AGE_BANDS, type AgeBand } from '#shared/domain/vocabulary';

/** The age asked for in the URL, or the one with most cars with rot among those with enough cars for a share. */
export function ageFrom(text: string | undefined, bands: readonly RotBand[]): AgeBand {
  const asked = AGE_BANDS.find((band) => band === text);
  if (asked) return asked;
  const enough = bands.filter(({ share }) => share !== null);
  const ofThese = enough.length > 0 ? enough : bands;
  const most = ofThese.reduce<RotBand | null>(
    (best, band) => (best === null || band.withRot > best.withRot ? band : best),
    null,
  );
  return most?.ageBand ?? '10-14';
}

/** What is known of an age; no car: none of anything. */
export function bandOf({ bands }: Pick<RotAnswer, 'bands'>, age: AgeBand): RotBand {
  return (
    bands.find(({ ageBand }) => ageBand === age) ?? {
      ageBand: age,
      cars: 0,
      withRot: 0,
      share: null,
      lower: null,
      upper: null,
      referenceShare: null,
    }
  );
}
