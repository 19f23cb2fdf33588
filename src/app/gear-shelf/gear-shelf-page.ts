import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { Sync } from '../core/sync';
import { TopBar } from '../shared/top-bar';
import { GearShelfStore } from './gear-shelf-store';
import { GearTable } from './gear-table';

/** The Gear shelf: which instruments the site has, what each can show, and until when its check holds. */
@Component({
  selector: 'bay-gear-shelf-page',
  imports: [GearTable, TopBar],
  template: `
    <bay-top-bar place="Gear shelf" [detail]="store.siteName()" />
    <main>
      @if (store.items(); as items) {
        @if (items.length > 0) {
          @if (store.overdue().length > 0) {
            <p class="overdue" role="status">{{ overdueText() }}</p>
          }
          <bay-gear-table [items]="items" />
        } @else {
          <div class="state">
            <h2>No instrument on this tablet</h2>
            <p>{{ emptyText() }}</p>
          </div>
        }
      } @else {
        <div class="state" aria-busy="true"><h2>Looking at the shelf</h2></div>
      }
    </main>
  `,
  styles: `
    :host {
      display: block;
      min-height: 100dvh;
    }
    main {
      padding: 20px 28px 48px;
    }
    .overdue {
      margin-bottom: 18px;
      padding: 12px 16px;
      border-left: 6px solid var(--out);
      border-radius: 0 10px 10px 0;
      background: var(--out-wash);
      font-weight: 600;
    }
    :host-context([data-theme='glare']) .overdue {
      border: 2px solid var(--rule);
      border-left: 8px solid var(--out);
    }
    @media (max-width: 640px) {
      main {
        padding-inline: 14px;
      }
    }
  `,
  providers: [GearShelfStore],
  host: { class: 'desk' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class GearShelfPage {
  protected readonly store = inject(GearShelfStore);
  private readonly sync = inject(Sync);

  protected readonly overdueText = computed(() => {
    const labels = this.store.overdue().map(({ label }) => label);
    const verb = labels.length === 1 ? 'is' : 'are';
    return `${labels.join(', ')} ${verb} overdue: a run can use it only with a reason, which the record keeps.`;
  });
  protected readonly emptyText = computed(() =>
    this.sync.view().isReached === false
      ? 'The instruments come from the server with the first sync. There is no network now.'
      : 'The site has none on the server yet, or the first sync is still under way.',
  );
}
