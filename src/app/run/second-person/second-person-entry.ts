import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { Step } from '../../../../procedures/document';
import { waitsForSomebody } from '../../../../procedures/engine/showing';
import type { Colleague, Person } from '../../core/wire';
import { entryField } from '../entry-draft';
import { BigAction } from '../frame/big-action';
import { HandSide } from '../frame/hand-side';
import { WideSide } from '../frame/wide-side';
import { StepEntry } from '../step-entry';

/**
 * What a step waits for from somebody else: a second person who looks, named here, and a release by the lead or the
 * manager, who does it signed in on this tablet. Whoever does the step sees what the run waits for.
 */
@Component({
  selector: 'bay-second-person-entry',
  imports: [BigAction, HandSide, WideSide],
  templateUrl: './second-person-entry.html',
  styleUrl: './second-person-entry.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SecondPersonEntry extends StepEntry<Step['kind']> {
  /** Everybody who has an account. */
  readonly people = input<readonly Colleague[]>([]);
  /** Who is signed in here. */
  readonly person = input<Person>();

  protected readonly chosen = entryField(this.run, 'second-person', '', ['verified']);
  protected readonly evidence = entryField(this.run, 'release-evidence', '', ['released']);

  private readonly current = computed(() => this.run().state.current);
  protected readonly waits = computed(() => waitsForSomebody(this.step(), this.current()));
  /** Who may look: anybody but the one who does the step. */
  protected readonly others = computed(() => this.people().filter(({ id }) => id !== this.current()?.claimedBy));
  protected readonly looked = computed(() => this.nameOf(this.current()?.verifiedBy));
  protected readonly released = computed(() => this.nameOf(this.current()?.releasedBy));
  protected readonly when = computed(() =>
    this.step().verify?.how === 'concurrent'
      ? 'Beside you, before it is done.'
      : 'By themselves, without being told what you saw.',
  );
  protected readonly who = computed(() => (this.step().release?.by === 'manager' ? 'the manager' : 'the lead'));
  /** The role in which the person who is signed in may release this; undefined where they may not. */
  protected readonly role = computed<'lead' | 'manager' | undefined>(() => {
    const role = this.person()?.role;
    if (role === 'manager') return 'manager';
    return role === 'lead' && this.step().release?.by === 'lead' ? 'lead' : undefined;
  });
  protected readonly missing = computed(() => {
    if (this.waits() === 'verification') return this.chosen() === '' ? 'Name above who has looked.' : undefined;
    if (this.role() === undefined) {
      const who = this.who();
      return `${who.charAt(0).toUpperCase()}${who.slice(1)} signs in on this tablet and opens the run. Set it aside meanwhile.`;
    }
    return this.evidence().trim() === '' ? 'Say above what it rests on.' : undefined;
  });
  protected readonly disturbs = computed(() => this.step().disturbs ?? []);

  protected looks(): void {
    this.commanded.emit({ do: 'verify', by: this.chosen() });
  }

  protected release(): void {
    const role = this.role();
    if (role !== undefined) this.commanded.emit({ do: 'release', role, evidence: this.evidence() });
  }

  private nameOf(id: string | undefined): string | undefined {
    return id === undefined ? undefined : (this.people().find((person) => person.id === id)?.displayName ?? 'somebody');
  }
}
