import { afterNextRender, ChangeDetectionStrategy, Component, DOCUMENT, inject, Injector, signal } from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import { NavigationEnd, Router, RouterOutlet } from '@angular/router';
import { filter } from 'rxjs';
import { AppUpdate } from './core/app-update';
import { HandSetting } from './core/hand-setting';
import { StorageRoom } from './core/storage-room';
import { Sync } from './core/sync';
import { Theme } from './core/theme';
import { UnexpectedErrors } from './core/unexpected-errors';

/** The root: everything else is a lazy route. What goes wrong unexpectedly is said here, over any page. */
@Component({
  selector: 'bay-root',
  imports: [RouterOutlet],
  templateUrl: './app.html',
  styleUrl: './app.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class App {
  private readonly injector = inject(Injector);
  private readonly router = inject(Router);
  private readonly document = inject(DOCUMENT);
  private readonly errors = inject(UnexpectedErrors);
  protected readonly update = inject(AppUpdate);

  protected readonly hasArrived = signal(false);
  protected readonly trouble = this.errors.shown;

  constructor() {
    inject(Theme);
    inject(HandSetting);
    this.router.events
      .pipe(
        filter((event) => event instanceof NavigationEnd),
        takeUntilDestroyed(),
      )
      .subscribe(() => {
        this.hasArrived.set(true);
        // Every page begins at its top.
        this.document.defaultView?.scrollTo(0, 0);
      });
    afterNextRender(() => this.startInBackground());
  }

  protected reload(): void {
    this.update.take();
  }

  protected dismiss(): void {
    this.errors.dismiss();
  }

  private startInBackground(): void {
    void this.injector.get(Sync).start();
    void this.injector.get(StorageRoom).secure();
    this.update.start();
  }
}
