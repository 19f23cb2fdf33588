import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { Router, RouterLink } from '@angular/router';
import { Session } from '../core/session';
import { Sync } from '../core/sync';
import { Theme } from '../core/theme';
import { PersonMenu } from './person-menu';
import { SyncChip } from './sync-chip';

/**
 * The bar over every desk screen: the way home, the place, where sending stands, and the person with the theme and
 * the way out. Chips of the place's own go between, as content. It knows the app's own stores, so that no page has to
 * hand them through.
 */
@Component({
  selector: 'bay-top-bar',
  imports: [PersonMenu, RouterLink, SyncChip],
  templateUrl: './top-bar.html',
  styleUrl: './top-bar.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class TopBar {
  private readonly router = inject(Router);
  private readonly session = inject(Session);
  private readonly sync = inject(Sync);
  private readonly chosenTheme = inject(Theme);

  /** The room: `Record room`. */
  readonly place = input.required<string>();
  /** What of it: `Crankcase valve seal, draft of version 5`. */
  readonly detail = input<string>();
  /** Whether sending matters here; the Practice bay sends nothing. */
  readonly showsSync = input(true);

  protected readonly person = this.session.person;
  protected readonly view = this.sync.view;
  protected readonly theme = this.chosenTheme.name;
  protected readonly waitingCount = computed(() => {
    const { events, evidence, documents } = this.view().waiting;
    return events + evidence + documents;
  });

  protected readonly chooseTheme = (name: Parameters<Theme['choose']>[0]): Promise<void> =>
    this.chosenTheme.choose(name);

  protected async signOut(): Promise<void> {
    await this.session.signOut();
    await this.router.navigateByUrl('/sign-in');
  }
}
