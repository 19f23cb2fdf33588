import { DestroyRef, ElementRef, inject, signal, type Signal } from '@angular/core';

/** The inner size of an element in CSS pixels. */
export interface ElementSize {
  readonly width: number;
  readonly height: number;
}

/**
 * The size of the component's own host element, kept up to date, so that drawings keep their text at full size
 * whatever room they get. Starts with `first`, which also stands where nothing measures (no ResizeObserver).
 * Call it in an injection context.
 */
export function hostSize(first: ElementSize): Signal<ElementSize> {
  const host = inject<ElementRef<HTMLElement>>(ElementRef).nativeElement;
  const size = signal(first, { equal: (a, b) => a.width === b.width && a.height === b.height });
  if (typeof ResizeObserver === 'undefined') return size;
  const observer = new ResizeObserver((entries) => {
    const box = entries.at(-1)?.contentRect;
    if (box && box.width > 0) size.set({ width: Math.round(box.width), height: Math.round(box.height) });
  });
  observer.observe(host);
  inject(DestroyRef).onDestroy(() => observer.disconnect());
  return size;
}
