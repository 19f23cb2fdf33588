import { DIALOG_DATA, DialogRef } from '@angular/cdk/dialog';
import { ChangeDetectionStrategy, Component, inject, signal } from '@angular/core';
import { FormControl, ReactiveFormsModule } from '@angular/forms';

/** What is about to be withdrawn. */
export interface WithdrawQuestion {
  readonly title: string;
  readonly version: number;
}

/** Asks why a version is withdrawn; closes with the reason, or without one when it is left alone. */
@Component({
  selector: 'bay-withdraw-dialog',
  imports: [ReactiveFormsModule],
  template: `
    <h2 id="withdraw-title">Withdraw version {{ question.version }}?</h2>
    <p>{{ question.title }}</p>
    <ul>
      <li>No new run starts with it on any tablet that has heard of it.</li>
      <li>Runs under way go on with it, and their record names it.</li>
      <li>It cannot be taken back: publish a new version instead.</li>
    </ul>
    <form (submit)="withdraw($event)">
      <div class="field">
        <label for="withdraw-reason">Why it is withdrawn</label>
        <textarea
          id="withdraw-reason"
          rows="3"
          maxlength="1000"
          [formControl]="reason"
          [attr.aria-invalid]="isMissing()"
          aria-describedby="withdraw-hint"
        ></textarea>
        @if (isMissing()) {
          <p id="withdraw-hint" class="error">Say why in a few words: the record keeps it.</p>
        } @else {
          <p id="withdraw-hint" class="hint">Kept with the version, for whoever asks later.</p>
        }
      </div>
      <div class="ways">
        <button type="button" class="plain" (click)="dialog.close()">Leave it published</button>
        <button type="submit" class="stop">Withdraw version {{ question.version }}</button>
      </div>
    </form>
  `,
  styleUrl: './desk-dialog.css',
  host: { class: 'desk' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class WithdrawDialog {
  protected readonly dialog = inject<DialogRef<string>>(DialogRef);
  protected readonly question = inject<WithdrawQuestion>(DIALOG_DATA);

  protected readonly reason = new FormControl('', { nonNullable: true });
  protected readonly isMissing = signal(false);

  protected withdraw(event: Event): void {
    event.preventDefault();
    const reason = this.reason.value.trim();
    this.isMissing.set(reason === '');
    if (reason !== '') this.dialog.close(reason);
  }
}
