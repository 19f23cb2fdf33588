import {
  afterNextRender,
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  type ElementRef,
  inject,
  input,
  linkedSignal,
  signal,
  viewChild,
} from '@angular/core';
import { Router } from '@angular/router';
import { Session, type SignInOutcome } from '../core/session';
import { Sync } from '../core/sync';
import { Theme } from '../core/theme';
import { AirPath } from '../shared/air-path';
import { ThemeSwitch } from '../shared/theme-switch';

type Refusal = Exclude<SignInOutcome, { readonly ok: true }>;

/** Name and password; without a network the last person of this tablet may go on with what is on it. */
@Component({
  selector: 'bay-sign-in-page',
  imports: [AirPath, ThemeSwitch],
  templateUrl: './sign-in-page.html',
  styleUrl: './sign-in-page.css',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SignInPage {
  private readonly router = inject(Router);
  private readonly session = inject(Session);
  private readonly sync = inject(Sync);
  protected readonly theme = inject(Theme);

  /** Where to go afterwards, an address of this app. */
  readonly next = input<string>();

  private readonly nameField = viewChild.required<ElementRef<HTMLInputElement>>('nameField');
  private readonly passwordField = viewChild.required<ElementRef<HTMLInputElement>>('passwordField');

  protected readonly last = computed(() => this.session.remembered()?.person);
  protected readonly isExpired = computed(() => this.session.state() === 'expired');
  protected readonly name = linkedSignal(() => this.last()?.name ?? '');
  protected readonly password = signal('');
  protected readonly isShown = signal(false);
  protected readonly isBusy = signal(false);
  protected readonly refusal = signal<Refusal | undefined>(undefined);
  protected readonly nameMissing = signal(false);
  protected readonly passwordMissing = signal(false);
  /** What stands beside the password field. */
  protected readonly passwordError = computed(() => {
    if (this.passwordMissing()) return 'Type your password.';
    const refusal = this.refusal();
    return refusal && refusal.why !== 'unreachable' ? refusal.message : undefined;
  });
  protected readonly isUnreachable = computed(() => this.refusal()?.why === 'unreachable');

  constructor() {
    // A late answer of the server may open the session while this page is up.
    effect(() => {
      if (this.session.state() === 'signed-in') void this.goOn();
    });
    afterNextRender(() => (this.name() === '' ? this.nameField() : this.passwordField()).nativeElement.focus());
  }

  protected async signIn(event: Event): Promise<void> {
    event.preventDefault();
    const name = this.name().trim();
    this.refusal.set(undefined);
    this.nameMissing.set(name === '');
    this.passwordMissing.set(this.password() === '');
    if (this.nameMissing()) return this.nameField().nativeElement.focus();
    if (this.passwordMissing()) return this.passwordField().nativeElement.focus();
    this.isBusy.set(true);
    const outcome = await this.session.signIn(name, this.password());
    this.isBusy.set(false);
    if (outcome.ok) return;
    this.refusal.set(outcome);
    if (outcome.why !== 'wrong') return;
    this.passwordField().nativeElement.focus();
    this.passwordField().nativeElement.select();
  }

  protected async goOnOffline(): Promise<void> {
    this.session.goOnOffline();
    await this.goOn();
  }

  private async goOn(): Promise<void> {
    void this.sync.again();
    const next = this.next();
    // Only ways inside this app: one slash, so that it names no other server.
    await this.router.navigateByUrl(next !== undefined && /^\/(?!\/)/.test(next) ? next : '/');
  }
}
