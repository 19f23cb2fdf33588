/** A way on. */
export interface Exit {
  /** A step's id, or `verdict`: the finding that an earlier exit named. */
  readonly to: string;
  readonly because: string;
  /** The finding (its step's id) that the run now heads for; it takes effect when the way reaches `verdict`. */
  readonly verdict?: string;
}

/** A way on under a condition; the first that holds is taken. */
export interface Branch extends Exit {
  readonly when: string;
  /** How often one run may take it; then `thenceforth` is taken instead. Every way back needs it. */
  readonly atMost?: number;
  readonly thenceforth?: Exit;
}
