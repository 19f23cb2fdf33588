import { DIALOG_DATA, DialogRef } from '@angular/cdk/dialog';
import { ChangeDetectionStrategy, Component, inject } from '@angular/core';

/** What is about to be published. */
export interface PublishQuestion {
  readonly title: string;
  readonly version: number;
}

/** Asks before a draft becomes a version that never changes again; closes with whether to do it. */
@Component({
  selector: 'bay-publish-dialog',
  template: `
    <h2 id="publish-title">Publish version {{ question.version }}?</h2>
    <p>{{ question.title }}</p>
    <ul>
      <li>It can never be changed again, only withdrawn.</li>
      <li>Tablets take it for new runs with their next sync.</li>
      <li>Runs that are under way keep the version they began with.</li>
    </ul>
    <div class="ways">
      <button type="button" class="plain" (click)="dialog.close(false)">Not yet</button>
      <button type="button" class="primary" (click)="dialog.close(true)">Publish version {{ question.version }}</button>
    </div>
  `,
  styleUrl: './desk-dialog.css',
  host: { class: 'desk' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PublishDialog {
  protected readonly dialog = inject<DialogRef<boolean>>(DialogRef);
  protected readonly question = inject<PublishQuestion>(DIALOG_DATA);
}
