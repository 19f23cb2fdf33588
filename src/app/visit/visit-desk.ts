import { inject, Injectable } from '@angular/core';
import { Session } from '../core/session';
import { SettingsBook } from '../core/settings-book';
import { clock, newId } from '../core/time-and-ids';
import { VisitBook } from '../core/visit-book';
import type { Visit } from '../core/wire';
import { WriteAhead } from '../core/write-ahead';
import { draftOf, emptyDraft, visitOf, type VisitDraft } from './visit-draft';

/** Opens and changes visits; what is typed is kept on the tablet until the visit is, so that a reload loses nothing. */
@Injectable({ providedIn: 'root' })
export class VisitDesk {
  private readonly settings = inject(SettingsBook);
  private readonly visits = inject(VisitBook);
  private readonly session = inject(Session);
  private readonly now = inject(clock);
  private readonly makeId = inject(newId);
  private readonly ahead = inject(WriteAhead);

  /** Key -> the newest draft that is not written to its end yet; undefined is to be forgotten. */
  private readonly unwritten = new Map<string, VisitDraft | undefined>();
  private written: Promise<void> = Promise.resolve();

  /** The draft of a visit: what was typed last, else the visit as it is kept, else an empty one. Undefined: no such visit. */
  async draft(visitId: string | undefined): Promise<VisitDraft | undefined> {
    this.findAgain(this.keyOf(visitId));
    await this.written.catch(() => undefined);
    const typed = await this.settings.read<VisitDraft>(this.keyOf(visitId));
    if (typed !== undefined) return { ...emptyDraft, ...typed };
    if (visitId === undefined) return emptyDraft;
    const visit = await this.visits.find(visitId);
    return visit && draftOf(visit);
  }

  /** Keeps what is typed so far, at once. */
  keepDraft(visitId: string | undefined, draft: VisitDraft): Promise<void> {
    return this.put(this.keyOf(visitId), draft);
  }

  /** Forgets what is typed. */
  forgetDraft(visitId: string | undefined): Promise<void> {
    return this.put(this.keyOf(visitId), undefined);
  }

  /** Keeps the visit that a draft without problems makes, and gives it back. */
  async keep(visitId: string | undefined, draft: VisitDraft): Promise<Visit> {
    const person = this.session.person();
    if (!person) throw new Error('Nobody is signed in');
    const before = visitId === undefined ? undefined : await this.visits.find(visitId);
    const now = this.now();
    const origin = {
      id: before?.id ?? this.makeId(),
      siteId: before?.siteId ?? person.siteId,
      openedBy: before?.openedBy ?? person.id,
      openedAt: before?.openedAt ?? now,
      changedAt: now,
    };
    const visit = visitOf(draft, origin, this.thisYear());
    await this.visits.keep(visit);
    await this.forgetDraft(visitId);
    return visit;
  }

  thisYear(): number {
    return new Date(this.now()).getFullYear();
  }

  /** One write at a time, each with the newest: nothing older ends up over it. */
  private put(key: string, draft: VisitDraft | undefined): Promise<void> {
    this.unwritten.set(key, draft);
    this.ahead.put(key, draft);
    const write = (): Promise<void> => this.write(key);
    this.written = this.written.then(write, write);
    return this.written;
  }

  private async write(key: string): Promise<void> {
    if (!this.unwritten.has(key)) return;
    const draft = this.unwritten.get(key);
    if (draft === undefined) await this.settings.forget(key);
    else await this.settings.write(key, draft);
    if (this.unwritten.get(key) !== draft) return;
    this.unwritten.delete(key);
    this.ahead.done(key);
  }

  /** Takes up what a page before could not finish writing. */
  private findAgain(key: string): void {
    const left = this.ahead.left<VisitDraft>(key);
    if (left !== undefined && !this.unwritten.has(key)) void this.put(key, left.value);
  }

  private keyOf(visitId: string | undefined): string {
    return `visit-draft:${visitId ?? `new:${this.session.person()?.id ?? ''}`}`;
  }
}
