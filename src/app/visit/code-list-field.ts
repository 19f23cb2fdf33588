import { ChangeDetectionStrategy, Component, computed, model, signal } from '@angular/core';
import { codeProblem, codesIn, codeWords } from '../shared/trouble-code-words';

/** Trouble codes, one after another or pasted together; each is checked before it is taken. */
@Component({
  selector: 'bay-code-list-field',
  templateUrl: './code-list-field.html',
  styleUrl: './code-list-field.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CodeListField {
  readonly codes = model.required<readonly string[]>();
  /** What stands in the field and was not added yet. */
  readonly typed = model('');

  protected readonly problem = signal<string | undefined>(undefined);
  protected readonly listed = computed(() => this.codes().map((code) => ({ code, words: codeWords(code) })));

  /** Takes what is typed; whether all of it could be taken. */
  take(): boolean {
    const given = codesIn(this.typed());
    const wrong = given.filter((code) => codeProblem(code) !== undefined);
    const right = given.filter((code) => codeProblem(code) === undefined && !this.codes().includes(code));
    if (right.length > 0) this.codes.set([...this.codes(), ...right]);
    this.typed.set(wrong.join(' '));
    this.problem.set(wrong[0] === undefined ? undefined : codeProblem(wrong[0]));
    return wrong.length === 0;
  }

  protected takeOnEnter(event: Event): void {
    event.preventDefault();
    this.take();
  }

  protected remove(code: string): void {
    this.codes.set(this.codes().filter((other) => other !== code));
  }
}
