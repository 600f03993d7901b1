import { ChangeDetectionStrategy, Component, input } from '@angular/core';

/** A thing recorded and what it says. */
export interface Fact {
  readonly name: string;
  readonly text: string;
  /** Something that asks for a second look; said in words too. */
  readonly marked?: boolean;
}

/** Facts as pairs of a quiet name and what is recorded. */
@Component({
  selector: 'us-fact-list',
  template: `
    <dl>
      @for (fact of facts(); track fact.name) {
        <div>
          <dt>{{ fact.name }}</dt>
          <dd [class.marked]="fact.marked">{{ fact.text }}</dd>
        </div>
      }
    </dl>
  `,
  styles: `
    div {
      display: flex;
      justify-content: space-between;
      gap: 4px 16px;
      padding: 5px 0;
      border-bottom: 1px solid var(--us-hairline);
      font-size: 14px;
      line-height: 20px;
    }
    div:last-child {
      border-bottom: 0;
    }
    dt {
      color: var(--us-quiet);
    }
    dd {
      text-align: end;
      max-width: 70%;
      overflow-wrap: break-word;
      font-variant-numeric: tabular-nums;
    }
    .marked {
      color: var(--us-oxide);
      font-weight: 600;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FactList {
  readonly facts = input.required<readonly Fact[]>();
}
