import { DIALOG_DATA, DialogRef } from '@angular/cdk/dialog';
import { ChangeDetectionStrategy, Component, inject } from '@angular/core';

/** Which draft is about to make room, and for what. */
export interface ReplaceDraftQuestion {
  /** The title of the draft that waits. */
  readonly title: string;
  /** When it was brought in, in words. */
  readonly when: string;
  readonly importedBy: string;
  readonly fileName: string;
}

/** Asks before a file takes the place of a draft that waits; closes with whether to do it. */
@Component({
  selector: 'bay-replace-draft-dialog',
  template: `
    <h2 id="replace-draft-title">Replace the draft that waits?</h2>
    <p>{{ question.title }}</p>
    <ul>
      <li>It was brought in by {{ question.importedBy }}, {{ question.when }}.</li>
      <li>{{ question.fileName }} takes its place, and the earlier draft is gone.</li>
      <li>Published versions stay as they are.</li>
    </ul>
    <div class="ways">
      <button type="button" class="plain" (click)="dialog.close(false)">Leave the earlier draft</button>
      <button type="button" class="primary" (click)="dialog.close(true)">Replace it</button>
    </div>
  `,
  styleUrl: './desk-dialog.css',
  host: { class: 'desk' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ReplaceDraftDialog {
  protected readonly dialog = inject<DialogRef<boolean>>(DialogRef);
  protected readonly question = inject<ReplaceDraftQuestion>(DIALOG_DATA);
}
