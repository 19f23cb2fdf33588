import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { TroubleCodeEntry } from '../../../procedures/engine/showing';
import { compareCodes, type ComparedCode } from './code-comparison';

/** Trouble codes as they were read; where an earlier reading is given, both side by side with what changed. */
@Component({
  selector: 'bay-codes-compared',
  template: `
    @if (before(); as earlier) {
      <table>
        <caption class="visually-hidden">
          Trouble codes before and after
        </caption>
        <thead>
          <tr>
            <th>Code</th>
            <th>Before</th>
            <th>After</th>
            <th><span class="visually-hidden">What changed</span></th>
          </tr>
        </thead>
        <tbody>
          @for (entry of compared(); track entry.code) {
            <tr [class.new]="entry.change === 'new'">
              <td class="num">{{ entry.code }}</td>
              <td>{{ entry.before?.status ?? 'not there' }}</td>
              <td>{{ entry.after?.status ?? 'not there' }}</td>
              <td class="change">{{ words[entry.change] }}</td>
            </tr>
          } @empty {
            <tr>
              <td colspan="4">No code, before or after</td>
            </tr>
          }
        </tbody>
      </table>
    } @else {
      <ul>
        @for (entry of codes(); track entry.code) {
          <li>
            <b class="num">{{ entry.code }}</b> {{ entry.status }}
            @if (entry.freezeFrame) {
              <span class="muted">freeze frame: {{ entry.freezeFrame }}</span>
            }
          </li>
        } @empty {
          <li>No trouble code</li>
        }
      </ul>
    }
  `,
  styles: `
    table {
      width: min(100%, 480px);
    }
    th,
    td {
      padding: 4px 12px 4px 0;
      font-size: inherit;
    }
    @media (max-width: 480px) {
      table {
        table-layout: fixed;
      }
      th,
      td {
        padding-right: 6px;
        font-size: 15px;
      }
    }
    .new .change {
      color: var(--out);
      font-weight: 600;
    }
    ul {
      list-style: none;
      display: grid;
      gap: 4px;
    }
    li {
      display: flex;
      flex-wrap: wrap;
      gap: 2px 10px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CodesCompared {
  readonly codes = input.required<readonly TroubleCodeEntry[]>();
  readonly before = input<readonly TroubleCodeEntry[]>();

  protected readonly words: Readonly<Record<ComparedCode['change'], string>> = {
    new: 'new',
    gone: 'gone',
    changed: 'status changed',
    same: 'unchanged',
  };
  protected readonly compared = computed(() => compareCodes(this.before() ?? [], this.codes()));
}
