import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { codeWords } from '../shared/trouble-code-words';

/** Trouble codes with what they mean. Brings the list of meanings with it: defer it. */
@Component({
  selector: 'bay-code-meanings',
  template: `
    <dl>
      @for (item of meanings(); track item.code) {
        <dt class="num">{{ item.code }}</dt>
        <dd>{{ item.words }}</dd>
      }
    </dl>
  `,
  styles: `
    dl {
      display: grid;
      grid-template-columns: auto minmax(0, 1fr);
      gap: 10px 18px;
    }
    dt {
      color: var(--ink-2);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CodeMeanings {
  readonly codes = input.required<readonly string[]>();

  protected readonly meanings = computed(() => this.codes().map((code) => ({ code, words: codeWords(code) })));
}
