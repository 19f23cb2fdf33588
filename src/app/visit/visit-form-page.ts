import {
  afterNextRender,
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  type ElementRef,
  inject,
  Injector,
  input,
  signal,
  untracked,
  viewChild,
} from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { Router, RouterLink } from '@angular/router';
import { map } from 'rxjs';
import { TopBar } from '../shared/top-bar';
import { CodeListField } from './code-list-field';
import { VinField } from './vin-field';
import { vinVerdict } from './vin-words';
import { VisitDesk } from './visit-desk';
import { draftProblems, emptyDraft, type VisitDraft } from './visit-draft';

/** Opens a visit, or changes one. */
@Component({
  selector: 'bay-visit-form-page',
  imports: [CodeListField, ReactiveFormsModule, RouterLink, TopBar, VinField],
  templateUrl: './visit-form-page.html',
  styleUrl: './visit-form-page.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class VisitFormPage {
  private readonly desk = inject(VisitDesk);
  private readonly router = inject(Router);
  private readonly injector = inject(Injector);

  /** The visit to change; absent for a new one. */
  readonly id = input<string>();

  private readonly codesField = viewChild(CodeListField);
  private readonly formElement = viewChild<ElementRef<HTMLFormElement>>('formElement');

  protected readonly form = inject(NonNullableFormBuilder).group({
    ...emptyDraft,
    odometerUnit: emptyDraft.odometerUnit as VisitDraft['odometerUnit'],
    codes: [emptyDraft.codes],
  });
  protected readonly draft = toSignal<VisitDraft, VisitDraft>(this.form.valueChanges.pipe(map(() => this.typed())), {
    initialValue: emptyDraft,
  });
  protected readonly phase = signal<'loading' | 'ready' | 'missing' | 'keeping'>('loading');
  protected readonly thisYear = this.desk.thisYear();
  protected readonly wantsAll = signal(false);
  /** Fields that were left once: what is wrong with them is said from then on. */
  private readonly left = signal<ReadonlySet<string>>(new Set());
  private readonly allProblems = computed(() => draftProblems(this.draft(), this.thisYear));
  protected readonly problems = computed(() => {
    const left = this.left();
    const shown = Object.entries(this.allProblems()).filter(([field]) => this.wantsAll() || left.has(field));
    return Object.fromEntries(shown) as ReturnType<typeof draftProblems>;
  });
  protected readonly yearHint = computed(() => {
    const verdict = vinVerdict(this.draft().vin, this.thisYear);
    return verdict.is === 'fits' ? verdict.year : undefined;
  });

  constructor() {
    // The store is outside: reading it is begun anew for each visit that the address names.
    effect(() => {
      const id = this.id();
      untracked(() => void this.open(id));
    });
    this.form.valueChanges.subscribe(() => this.keepTyped());
  }

  protected leave(field: string): void {
    this.left.update((left) => new Set([...left, field]));
  }

  protected async keep(event: Event): Promise<void> {
    event.preventDefault();
    const areCodesTaken = this.codesField()?.take() ?? true;
    this.wantsAll.set(true);
    if (!areCodesTaken || Object.keys(this.allProblems()).length > 0) {
      this.showFirstProblem();
      return;
    }
    this.phase.set('keeping');
    const visit = await this.desk.keep(this.id(), this.typed());
    await this.router.navigate(['/visit', visit.id], { replaceUrl: true });
  }

  protected async giveUp(): Promise<void> {
    await this.desk.forgetDraft(this.id());
    await this.router.navigateByUrl(this.id() === undefined ? '/' : `/visit/${this.id()}`);
  }

  private async open(id: string | undefined): Promise<void> {
    this.phase.set('loading');
    const draft = await this.desk.draft(id);
    if (draft === undefined) return this.phase.set('missing');
    this.form.setValue({ ...draft }, { emitEvent: true });
    this.phase.set('ready');
  }

  private typed(): VisitDraft {
    return this.form.getRawValue();
  }

  /** Every change is kept at once: the page may be loaded again after any key. */
  private keepTyped(): void {
    if (this.phase() === 'ready') void this.desk.keepDraft(this.id(), this.typed());
  }

  private showFirstProblem(): void {
    afterNextRender(
      () => {
        const first = this.formElement()?.nativeElement.querySelector<HTMLElement>('[aria-invalid="true"]');
        first?.focus();
      },
      { injector: this.injector },
    );
  }
}
