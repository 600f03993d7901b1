import { LiveAnnouncer } from '@angular/cdk/a11y';
import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import { listTargets } from '#shared/contracts/targets';
import { TARGET_MEASURES } from '#shared/domain/target-measures';
import { Api } from '../../core/api/api';
import { Catalogue } from '../../core/catalogue/catalogue';
import { Session } from '../../core/session/session';
import { Answer } from '../../ui/answer/answer';
import { LoadState } from '../../ui/load-state/load-state';
import { MEASURE_UNITS } from '../../ui/measure-words';
import { TargetCell } from './target-cell';
import { answerTargets, targetRows, type TargetRow } from './target-rows';

/** What the network and its branches want to reach: set for the network by head office, for a branch by its lead too. */
@Component({
  selector: 'us-targets-page',
  imports: [Answer, LoadState, TargetCell],
  templateUrl: './targets-page.html',
  styleUrl: './targets-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class TargetsPage {
  private readonly catalogue = inject(Catalogue);
  private readonly announcer = inject(LiveAnnouncer);
  private readonly role = inject(Session).role;

  protected readonly targets = inject(Api).read(listTargets, () => ({}));
  protected readonly view = computed(() => {
    const targets = this.targets.value();
    return (
      targets && {
        answer: answerTargets(targets),
        rows: targetRows(targets, (code) => this.catalogue.branchName(code)),
      }
    );
  });
  protected readonly columns = TARGET_MEASURES.map((measure) => {
    const [name = '', unit = ''] = MEASURE_UNITS[measure].split(', ', 2);
    return { measure, name: `${name.charAt(0).toUpperCase()}${name.slice(1)}`, unit };
  });
  protected readonly last = signal('');

  protected mayChange({ key }: TargetRow): boolean {
    return key !== 'network' || this.role() === 'head_office';
  }

  protected changed(words: string): void {
    this.last.set(words);
    void this.announcer.announce(words);
    this.targets.reload();
    // The margin's target stands in the catalogue too.
    this.catalogue.state.reload();
  }
}
