import { ChangeDetectionStrategy, Component, computed, linkedSignal } from '@angular/core';
import type { TroubleCodeEntry } from '../../../../procedures/engine/showing';
import { codeWords } from '../../shared/trouble-code-words';
import { entryField } from '../entry-draft';
import { BigAction } from '../frame/big-action';
import { HandSide } from '../frame/hand-side';
import { WideSide } from '../frame/wide-side';
import { StepEntry } from '../step-entry';
import { CodePad } from './code-pad';
import { isWholeCode, typeCode } from './code-text';

type Status = TroubleCodeEntry['status'];

/** Trouble codes with status and freeze frame, one by one, or none. */
@Component({
  selector: 'bay-codes-entry',
  imports: [BigAction, CodePad, HandSide, WideSide],
  templateUrl: './codes-entry.html',
  styleUrl: './codes-entry.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CodesEntry extends StepEntry<'codes'> {
  protected readonly codes = entryField<readonly TroubleCodeEntry[]>(this.run, 'codes', []);
  /** Whether a code is being entered; otherwise the list is shown. */
  protected readonly isTyping = entryField(this.run, 'is-typing', false);
  /** The code that is being entered. */
  protected readonly text = entryField(this.run, 'code', '');
  protected readonly status = entryField<Status>(this.run, 'status', 'stored');
  protected readonly freezeFrame = entryField(this.run, 'freeze-frame', '');
  protected readonly isWhole = computed(() => isWholeCode(this.text()));
  protected readonly meaning = computed(() => codeWords(this.text()));
  protected readonly shown = computed(() => this.text().padEnd(5, '\u00b7'));
  protected readonly statuses: readonly Status[] = ['stored', 'pending', 'permanent'];
  /** Codes that are known of already: those of the visit, and those of the step that this one is compared with. */
  protected readonly known = computed(() => {
    const { state } = this.run();
    const compared = this.step().comparedWith;
    const earlier = compared === undefined ? [] : (state.codes[compared]?.codes ?? []).map(({ code }) => code);
    const taken = this.codes().map(({ code }) => code);
    return [...new Set([...earlier, ...state.visit.codes])].filter((code) => !taken.includes(code));
  });

  /** Known codes that were looked for and are not there, in this claim. */
  protected readonly absent = entryField<readonly string[]>(this.run, 'absent', []);
  private readonly unanswered = computed(() => this.known().filter((code) => !this.absent().includes(code)));
  protected readonly isAnswered = computed(() => this.unanswered().length === 0);
  protected readonly primaryLabel = computed(() => {
    const [first, ...more] = this.unanswered();
    if (first !== undefined)
      return more.length === 0 ? `First say above:\nis ${first} there?` : 'First answer\nthe codes above';
    if (this.codes().length > 0) return 'These are all,\ngo on';
    return this.known().length > 0 ? 'None of them is there:\nno code, go on' : 'No code at all,\ngo on';
  });
  /** What the primary action points at while known codes are unanswered, once it was tapped. */
  protected readonly pointer = computed(() =>
    this.wasTried() && !this.isAnswered()
      ? `Say of ${this.unanswered().join(', ')} whether it is there or not.`
      : undefined,
  );
  private readonly wasTried = linkedSignal<number | undefined, boolean>({
    source: () => this.run().state.current?.claimedSeq,
    computation: () => false,
  });

  protected readonly meaningOf = codeWords;

  protected begin(code = ''): void {
    this.status.set('stored');
    this.freezeFrame.set('');
    this.text.set(code);
    this.isTyping.set(true);
  }

  protected setAbsent(code: string, isAbsent: boolean): void {
    this.absent.update((absent) => [...absent.filter((other) => other !== code), ...(isAbsent ? [code] : [])]);
  }

  protected type(key: string): void {
    this.text.update((text) => typeCode(text, key));
  }

  protected erase(): void {
    if (this.text() === '') this.isTyping.set(false);
    else this.text.update((text) => text.slice(0, -1));
  }

  protected keep(): void {
    const code = this.text();
    const freezeFrame = this.freezeFrame().trim();
    const entry = { code, status: this.status(), ...(freezeFrame === '' ? {} : { freezeFrame }) };
    this.codes.update((codes) => [...codes.filter((other) => other.code !== code), entry]);
    this.isTyping.set(false);
  }

  protected remove(code: string): void {
    this.codes.update((codes) => codes.filter((other) => other.code !== code));
  }

  protected record(): void {
    this.wasTried.set(true);
    if (!this.isAnswered()) return;
    this.commanded.emit({ do: 'record-codes', codes: this.codes() });
  }
}
