import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { ResultShape } from './result-shape';
import { resultWords, type ShownResult } from './result-words';

/** A result as its shape alone, with its words for those who do not see it. Put the words beside it where there is room. */
@Component({
  selector: 'bay-result-mark',
  imports: [ResultShape],
  template: `
    <svg
      viewBox="-14 -14 28 28"
      [attr.width]="size()"
      [attr.height]="size()"
      [attr.role]="isSilent() ? null : 'img'"
      [attr.aria-hidden]="isSilent() ? 'true' : null"
      [attr.aria-label]="isSilent() ? null : words[result()]"
    >
      <g bay-result-shape [result]="result()" [radius]="13" />
    </svg>
  `,
  styles: ':host { display: inline-flex; vertical-align: -0.2em } svg { display: block; overflow: visible }',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ResultMark {
  readonly result = input.required<ShownResult>();
  /** Width and height in CSS pixels. */
  readonly size = input(26);
  /** Whether the words stand beside it anyway, so that nobody hears them twice. */
  readonly isSilent = input(false);

  protected readonly words = resultWords;
}
