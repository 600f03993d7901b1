import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  signal,
  viewChild,
} from '@angular/core';
import { ACTIONS, CONDITIONS } from '#shared/domain/vocabulary';
import { Catalogue } from '../../../core/catalogue/catalogue';
import { Caution } from '../../../ui/caution/caution';
import { currencySign, formatMinutes } from '../../../ui/format';
import { Trouble } from '../../../ui/trouble/trouble';
import { CONDITION_NAMES } from '../../../ui/words';
import type { UndersidePlace } from '../../../underside-map/underside-input';
import { UndersidePick } from '../../../underside-map/underside-pick';
import {
  type DraftFinding,
  findingPath,
  headingOf,
  moveFinding,
  onMap,
  repairMinutesOf,
  setFinding,
} from '../findings-edit';
import { OpenDraft } from '../open-draft';
import { type Choice, ChoiceRow } from '../pieces/choice-row';
import { FindingRows } from '../pieces/finding-rows';
import { MinutesSteps } from '../pieces/minutes-steps';
import { PhotosHere } from '../pieces/photos-here';
import { SendField } from '../pieces/send-field';
import { findingCautions } from '../send-cautions';
import { minutesRun, minutesWritten } from '../timers';

const DONE_WORDS: Readonly<Record<(typeof ACTIONS)[number], string>> = {
  treated: 'treated',
  patched: 'patched',
  deferred: 'deferred',
  declined: 'declined',
};

/** Fourth step: rust on the car seen from below, one finding at a time, with its photos. */
@Component({
  selector: 'us-findings-step',
  imports: [
    Caution,
    ChoiceRow,
    FindingRows,
    MinutesSteps,
    PhotosHere,
    SendField,
    Trouble,
    UndersidePick,
  ],
  templateUrl: './findings-step.html',
  styleUrls: ['./step.scss', './findings-step.scss'],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FindingsStep {
  protected readonly draft = inject(OpenDraft);
  private readonly catalogue = inject(Catalogue);
  private readonly pick = viewChild.required(UndersidePick);
  /** The finding being written; none while the next one has no place yet. */
  readonly ref = signal<string | undefined>(undefined);
  readonly view = signal<'picture' | 'list'>('picture');

  protected readonly conditions: readonly Choice[] = CONDITIONS.map((value) => ({
    value,
    words: CONDITION_NAMES[value],
    sign: value,
  }));
  protected readonly actions: readonly Choice[] = ACTIONS.map((value) => ({
    value,
    words: DONE_WORDS[value],
  }));
  protected readonly bearing: readonly Choice[] = [
    { value: true, words: 'load-bearing' },
    { value: false, words: 'not', name: 'not load-bearing' },
  ];
  protected readonly sign = computed(() => currencySign(this.catalogue.currency()));
  protected readonly findings = computed(() => this.draft.document().findings ?? []);
  protected readonly finding = computed((): DraftFinding | undefined =>
    this.findings().find((one) => one.ref === this.ref()),
  );
  protected readonly heading = computed(() => headingOf(this.draft.document(), this.ref()));
  /** Those set before, numbered on the map; the newest is filled in while it is written, without its number over it. */
  protected readonly marks = computed(() => {
    const newest = this.findings().at(-1)?.ref;
    return onMap(this.findings().filter(({ ref }) => ref !== newest || ref !== this.ref()));
  });
  protected readonly place = computed((): UndersidePlace | null => {
    const { zone, side } = this.finding() ?? {};
    return zone && side ? { zone, side } : null;
  });
  protected readonly cautions = computed(() => {
    const finding = this.finding();
    return finding ? findingCautions(finding) : [];
  });
  protected readonly repair = computed(() => {
    const document = this.draft.document();
    const found = repairMinutesOf(document);
    const stage =
      (minutesWritten(document, 'repair') ?? 0) + minutesRun(document, 'repair', this.draft.now());
    return found > stage
      ? `Repair of the findings adds to ${formatMinutes(found)}, the repair stage has ${formatMinutes(stage)}.`
      : undefined;
  });

  protected readonly path = (field: keyof DraftFinding): string =>
    findingPath(this.ref() ?? '', field);

  /** A place picked: sets a new finding there, or moves the one being written. While the map asks which zone is meant, nothing changes. */
  protected placed(place: UndersidePlace | null): void {
    if (!place) return;
    const ref = this.ref();
    if (ref !== undefined) {
      this.draft.rewrite((document) => moveFinding(document, ref, place));
      return;
    }
    const set = setFinding(this.draft.document(), place);
    this.draft.rewrite(() => set.document);
    this.ref.set(set.ref);
  }

  /** Turns from the picture to the list and back; the two are one control. */
  turn(): void {
    this.view.set(this.view() === 'picture' ? 'list' : 'picture');
  }

  /** Begins the next one. */
  addAnother(): void {
    this.turnTo(undefined);
  }

  /** Turns to a finding, or to the next one while it has no place yet. */
  protected turnTo(ref: string | undefined): void {
    this.pick().forgetTouch();
    this.ref.set(ref);
  }
}
