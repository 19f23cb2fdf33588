import { HttpClient } from '@angular/common/http';
import { computed, inject, Injectable, signal } from '@angular/core';
import { firstValueFrom } from 'rxjs';
import { ApiProblem } from './api-problem';
import { OfflineStore } from './offline-store';
import type { TabletKeyRow } from './stored-rows';

/** Whether the server knows this tablet: `refused` when the person who asked may not register one. */
export type TabletState = 'unknown' | 'unregistered' | 'registered' | 'refused';

const algorithm = { name: 'ECDSA', namedCurve: 'P-256' } as const;
const signing = { name: 'ECDSA', hash: 'SHA-256' } as const;

/**
 * This tablet's own key: a P-256 pair whose private half cannot be read out, not even by this app. It signs what is
 * sent, whoever is signed in. A lead or a manager registers the public half once.
 */
@Injectable({ providedIn: 'root' })
export class Tablet {
  private readonly http = inject(HttpClient);
  private readonly store = inject(OfflineStore);

  private readonly row = signal<TabletKeyRow | undefined>(undefined);
  private readonly wasRefused = signal(false);
  private readonly isRead = signal(false);
  private reading: Promise<void> | undefined;

  readonly state = computed<TabletState>(() => {
    if (this.row()?.tabletId !== undefined) return 'registered';
    if (!this.isRead()) return 'unknown';
    return this.wasRefused() ? 'refused' : 'unregistered';
  });
  /** The id that the server gave; undefined before. */
  readonly id = computed(() => this.row()?.tabletId);
  /** What people call it. */
  readonly label = computed(() => this.row()?.label);

  /** The registered id, read from the store where that has not been done yet. */
  async registeredId(): Promise<string | undefined> {
    await this.read();
    return this.id();
  }

  /**
   * Registers this tablet under a name (without one: by four signs of its key), unless it is registered. Throws `ApiProblem` when the server cannot be
   * reached or fails; a refusal (403) is a state, not an error.
   */
  async register(name?: string): Promise<TabletState> {
    await this.read();
    if (this.row()?.tabletId !== undefined) return this.state();
    const row = this.row() ?? (await this.makeKeys());
    const label =
      name ??
      `Tablet ${(row.publicKey.x ?? '')
        .replace(/[^A-Za-z0-9]/g, '')
        .slice(0, 4)
        .toUpperCase()}`;
    try {
      const answer = await firstValueFrom(
        this.http.post<{ id: string; label: string }>('/api/tablets', { label, publicKey: row.publicKey }),
      );
      const registered = { ...row, tabletId: answer.id, label: answer.label };
      await this.store.keys.put(registered);
      this.row.set(registered);
      this.wasRefused.set(false);
    } catch (error) {
      if (!(error instanceof ApiProblem) || error.status !== 403) throw error;
      this.wasRefused.set(true);
    }
    return this.state();
  }

  /**
   * The server does not know this tablet (any more): its database was made anew. The key stays; registering asks
   * again.
   */
  async forgetRegistration(): Promise<void> {
    const row = this.row();
    if (!row) return;
    const unregistered = { ...row, tabletId: undefined };
    await this.store.keys.put(unregistered);
    this.row.set(unregistered);
  }

  /** Signs bytes with the tablet's key: ECDSA P-256 with SHA-256, r and s side by side, base64url. */
  async sign(bytes: Uint8Array<ArrayBuffer>): Promise<string> {
    await this.read();
    const row = this.row();
    if (!row) throw new Error('This tablet has no key yet');
    const signature = await crypto.subtle.sign(signing, row.privateKey, bytes);
    return base64Url(new Uint8Array(signature));
  }

  private read(): Promise<void> {
    this.reading ??= this.store.keys.get('tablet').then((row) => {
      this.row.set(row);
      this.isRead.set(true);
    });
    return this.reading;
  }

  private async makeKeys(): Promise<TabletKeyRow> {
    const pair = await crypto.subtle.generateKey(algorithm, false, ['sign', 'verify']);
    const publicKey = await crypto.subtle.exportKey('jwk', pair.publicKey);
    const row: TabletKeyRow = {
      id: 'tablet',
      publicKey,
      privateKey: pair.privateKey,
      tabletId: undefined,
      label: undefined,
    };
    await this.store.keys.put(row);
    this.row.set(row);
    return row;
  }
}

function base64Url(bytes: Uint8Array): string {
  const text = Array.from(bytes, (byte) => String.fromCharCode(byte)).join('');
  return btoa(text).replaceAll('+', '-').replaceAll('/', '_').replaceAll('=', '');
}
