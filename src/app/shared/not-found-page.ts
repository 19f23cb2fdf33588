import { ChangeDetectionStrategy, Component } from '@angular/core';
import { RouterLink } from '@angular/router';
import { TopBar } from './top-bar';

/** An address that leads nowhere. */
@Component({
  selector: 'bay-not-found-page',
  imports: [RouterLink, TopBar],
  template: `
    <bay-top-bar place="Not found" />
    <main class="state">
      <h1>Nothing is kept here</h1>
      <p>The address leads nowhere on this tablet. Nothing was lost.</p>
      <a routerLink="/" class="primary">Back to the Bench</a>
    </main>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NotFoundPage {}
