import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { listJobs } from '#shared/contracts/job-list';
import { BODY_TYPES } from '#shared/domain/vocabulary';
import { Api } from '../../../core/api/api';
import { knownCars, modelsFor } from '../../../core/catalogue/known-cars';
import { BODY_TYPE_NAMES } from '../../../ui/words';
import { OpenDraft } from '../open-draft';
import { ChoiceList } from '../pieces/choice-list';
import { SendField } from '../pieces/send-field';

/** Jobs looked through for makes and models to offer. */
const LOOKED_THROUGH = 200;

/** First step: which job, which car. */
@Component({
  selector: 'us-car-step',
  imports: [ChoiceList, SendField],
  template: `
    <us-send-field
      path="/jobRef"
      label="Reference"
      [most]="64"
      [locked]="isCorrection()"
      [note]="
        isCorrection()
          ? 'The job as it is on record; its reference stays.'
          : 'The number on the job card. Sent twice under the same one, it is kept once.'
      "
    />
    <us-send-field path="/vehicle/make" label="Make" [most]="60" [offered]="makes()" />
    <us-send-field path="/vehicle/model" label="Model" [most]="60" [offered]="models()" />
    <us-choice-list path="/vehicle/bodyType" label="Body type" [choices]="bodyTypes" />
    <us-send-field
      path="/vehicle/firstRegistered"
      label="First registered"
      kind="month"
      placeholder="2009-05"
    />
    <us-send-field path="/vehicle/odometerKm" label="Odometer, km" kind="whole" />
    <us-send-field
      path="/vehicle/key"
      label="Branch's key of the car"
      [most]="64"
      note="Your own code for it, so that its next visit finds this one. Not the number plate."
    />
  `,
  styleUrl: './step.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CarStep {
  private readonly draft = inject(OpenDraft);
  private readonly lately = inject(Api).read(listJobs, () => ({
    query: { limit: LOOKED_THROUGH },
  }));
  private readonly known = computed(() => knownCars(this.lately.value()?.items ?? []));
  protected readonly bodyTypes = BODY_TYPES.map((value) => ({
    value,
    words: BODY_TYPE_NAMES[value],
  }));
  protected readonly isCorrection = computed(() => this.draft.kept()?.corrects !== undefined);
  protected readonly makes = computed(() => this.known().map(({ make }) => make));
  protected readonly models = computed(() =>
    modelsFor(this.known(), this.draft.document().vehicle?.make ?? ''),
  );
}
