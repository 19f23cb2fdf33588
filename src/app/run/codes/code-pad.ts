import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';
import { codeSystems, hexDigits, mayFollow } from './code-text';

/** Keys for one trouble code: the letter first, then the digits that may follow. A keyboard's keys work as well. */
@Component({
  selector: 'bay-code-pad',
  template: `
    <div class="letters">
      @for (system of systems; track system.letter) {
        <button type="button" [disabled]="text() !== ''" (click)="pressed.emit(system.letter)">
          <b>{{ system.letter }}</b>
          <small>{{ system.words }}</small>
        </button>
      }
    </div>
    <div class="digits">
      @for (digit of digits; track digit) {
        <button type="button" [disabled]="text() === '' || !mayFollow(text(), digit)" (click)="pressed.emit(digit)">
          {{ digit }}
        </button>
      }
    </div>
  `,
  styleUrl: './code-pad.css',
  host: { '(window:keydown)': 'take($event)' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CodePad {
  readonly text = input.required<string>();
  readonly pressed = output<string>();
  readonly erased = output();

  protected readonly systems = codeSystems;
  protected readonly digits = hexDigits;
  protected readonly mayFollow = mayFollow;

  protected take(event: KeyboardEvent): void {
    if (event.defaultPrevented || event.ctrlKey || event.metaKey || event.altKey) return;
    if (event.key === 'Backspace') {
      event.preventDefault();
      this.erased.emit();
    } else if (/^[0-9a-zA-Z]$/.test(event.key)) {
      event.preventDefault();
      this.pressed.emit(event.key);
    }
  }
}
