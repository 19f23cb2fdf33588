import { ChangeDetectionStrategy, Component } from '@angular/core';
import { RouterLink } from '@angular/router';
import { TopBar } from './top-bar';

/** A room that this role has no key to. */
@Component({
  selector: 'bay-not-yours-page',
  imports: [RouterLink, TopBar],
  template: `
    <bay-top-bar place="Not yours" />
    <main class="state">
      <h1>This room is not yours</h1>
      <p>Your role has no key to it. A lead or a manager can open it for you.</p>
      <a routerLink="/" class="primary">Back to the Bench</a>
    </main>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NotYoursPage {}
