import { ChangeDetectionStrategy, Component, input, signal } from '@angular/core';
import type { RunEvent } from '../../../procedures/engine/showing';
import { clockTime } from '../core/time-words';

/** All events as they are stored, in their order; data and hashes of one on demand. */
@Component({
  selector: 'bay-event-list',
  template: `
    @if (isOpen()) {
      <ol>
        @for (event of events(); track event.seq) {
          <li>
            <details (toggle)="note(event.seq, $event)">
              <summary>
                <span class="seq num">{{ event.seq }}</span>
                <span class="num">{{ clock(event.at) }}</span>
                <b>{{ event.type }}</b>
                <span class="muted">{{ names().get(event.actor) ?? event.actor }}</span>
              </summary>
              @if (opened().has(event.seq)) {
                <dl>
                  <dt>Hash</dt>
                  <dd>{{ event.hash }}</dd>
                  <dt>Follows on</dt>
                  <dd>{{ event.prev }}</dd>
                  <dt>Id</dt>
                  <dd>{{ event.id }}</dd>
                  <dt>Tablet</dt>
                  <dd>{{ event.device }}, build {{ event.build }}</dd>
                </dl>
                <pre>{{ text(event) }}</pre>
              }
            </details>
          </li>
        }
      </ol>
    } @else {
      <button type="button" class="plain" (click)="isOpen.set(true)">Show all {{ events().length }} events</button>
    }
  `,
  styleUrl: './event-list.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class EventList {
  readonly events = input.required<readonly RunEvent[]>();
  /** Person's id -> how they are called. */
  readonly names = input<ReadonlyMap<string, string>>(new Map());

  protected readonly isOpen = signal(false);
  /** Events whose particulars were asked for: two thousand of them in the page would slow every reader down. */
  protected readonly opened = signal<ReadonlySet<number>>(new Set());
  protected readonly clock = clockTime;
  protected readonly text = (event: RunEvent): string => JSON.stringify(event.data, null, 2);

  protected note(seq: number, event: Event): void {
    const isOpen = event.target instanceof HTMLDetailsElement && event.target.open;
    if (isOpen) this.opened.update((opened) => new Set(opened).add(seq));
  }
}
