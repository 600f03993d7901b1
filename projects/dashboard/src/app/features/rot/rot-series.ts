import type { RotAnswer } from '#shared/contracts/rot';
import { AGE_BANDS, type AgeBand } from '#shared/domain/vocabulary';
import type { AgeRegionInput } from '../../charts/age-region/age-region-input';
import { formatCars, formatShare } from '../../ui/format';
import type { UndersideArea } from '../../underside-map/underside-input';
import { bandOf } from './age-choice';
import { openedUpSentence } from './opened-up';
import { answerRot, type RotSentences } from './rot-answer';
import { areasOf, mostRot } from './rot-areas';
import { regionNote, regionPicture } from './rot-regions';
import { ageLabel, agedWords, carsCalled, placeInSentence, type RotWords } from './rot-words';

/** One age as the control offers it. */
export interface AgeOption {
  readonly age: AgeBand;
  /** "10–14 years". */
  readonly name: string;
  /** "42 %", absent where there is none. */
  readonly share: string | null;
  /** "of 214 cars", "4 cars, too few", "no cars". */
  readonly cars: string;
  readonly areas: readonly UndersideArea[];
}

/** Everything the page shows of one age. */
export interface RotView {
  readonly answer: RotSentences;
  /** Absent without a car. */
  readonly pictures: {
    readonly ages: readonly AgeOption[];
    readonly areas: readonly UndersideArea[];
    readonly finding: string;
    readonly note: string;
    readonly regions: AgeRegionInput;
    readonly regionsNote: string;
    readonly opened: string;
  } | null;
}

/** Turns the answer into the page's sentences and pictures. Pure. */
export function rotView(answer: RotAnswer, age: AgeBand, words: RotWords): RotView {
  const areas = areasOf(answer, age);
  return {
    answer: answerRot(answer, age, words),
    pictures:
      answer.jobs === 0
        ? null
        : {
            ages: AGE_BANDS.map((band) => ageOption(answer, band)),
            areas,
            finding: mapFinding(answer, age, areas, words),
            note: `Share of ${formatCars(bandOf(answer, age).cars)} aged ${agedWords(age)} with rot there; a car counts once in each place`,
            regions: regionPicture(answer, age, words),
            regionsNote: regionNote(answer),
            opened: openedUpSentence(answer.openedUp),
          },
  };
}

function ageOption(answer: RotAnswer, age: AgeBand): AgeOption {
  const { cars, share } = bandOf(answer, age);
  return {
    age,
    name: age === '20+' ? '20 years and over' : `${ageLabel(age)} years`,
    share: share === null ? null : formatShare(share),
    cars: carsWords(cars, share),
    areas: areasOf(answer, age),
  };
}

function carsWords(cars: number, share: number | null): string {
  if (cars === 0) return 'no cars';
  return share === null ? `${formatCars(cars)}, too few` : `of ${formatCars(cars)}`;
}

/** Named in the text alternative of the map; the rest stands in its table. */
const MOST_PLACES = 5;

function mapFinding(
  answer: RotAnswer,
  age: AgeBand,
  areas: readonly UndersideArea[],
  { bodyTypes }: RotWords,
): string {
  const who = `${carsCalled(bodyTypes)} aged ${agedWords(age)}`;
  const { share, cars } = bandOf(answer, age);
  if (share === null) return `Too few ${who} yet for a share in any place: ${formatCars(cars)}.`;
  const places = mostRot(areas).slice(0, MOST_PLACES);
  if (places.length === 0) return `No rot on ${who}.`;
  const said = places.map((place) => {
    const sides = areas.filter(({ zone }) => zone === place.zone).map(({ side }) => side);
    return `${placeInSentence(place.zone, place.side, sides)} ${place.share === null ? '' : formatShare(place.share)}`;
  });
  return `Where ${who} had rot most often: ${said.join('; ')}.`;
}
