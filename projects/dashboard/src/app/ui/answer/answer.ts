import { NgTemplateOutlet } from '@angular/common';
import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { type Params, RouterLink } from '@angular/router';
import { DefinitionLink } from '../definition-link/definition-link';

/** A piece of an answer's sentence: plain words, the one large figure, quiet words (interval, number of cars), or words that lead on. */
export type AnswerPart =
  | string
  | { readonly figure: string }
  | { readonly quiet: string }
  | { readonly text: string; readonly link: string; readonly query?: Params };

/** The answer at the top of a page: one sentence with its figure large, and a second line of why or where. It is the page's heading. */
@Component({
  selector: 'us-answer',
  imports: [DefinitionLink, NgTemplateOutlet, RouterLink],
  templateUrl: './answer.html',
  styleUrl: './answer.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Answer {
  readonly sentence = input.required<readonly AnswerPart[]>();
  readonly second = input<readonly AnswerPart[]>([]);
  /** Anchor on the page "How it is counted" of the figure's definition. */
  readonly definition = input<string>();

  protected view(part: AnswerPart): {
    kind: 'words' | 'figure' | 'quiet' | 'link';
    text: string;
    link?: string;
    query?: Params;
  } {
    if (typeof part === 'string') return { kind: 'words', text: part };
    if ('figure' in part) return { kind: 'figure', text: part.figure };
    if ('quiet' in part) return { kind: 'quiet', text: part.quiet };
    return { kind: 'link', text: part.text, link: part.link, query: part.query };
  }
}
