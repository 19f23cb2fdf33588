import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { ShownResult } from './result-words';

/**
 * The shape of a result, drawn round the origin inside someone else's SVG: in band a disc with a tick, out of band a
 * square with a cross, too close to call a ring half filled. Never by colour alone. `not-judged` is an
 * empty diamond, `done` a small dot, `not-measured` an empty ring with a bar.
 */
@Component({
  // An SVG's children must be SVG elements, so this one takes a group.
  // eslint-disable-next-line @angular-eslint/component-selector
  selector: 'svg:g[bay-result-shape]',
  template: `
    @switch (result()) {
      @case ('in') {
        <svg:circle [attr.r]="radius()" fill="var(--in)" />
        <svg:path [attr.d]="tick()" fill="none" stroke="var(--sheet)" [attr.stroke-width]="pen()" />
      }
      @case ('out') {
        <svg:rect
          [attr.x]="-half()"
          [attr.y]="-half()"
          [attr.width]="2 * half()"
          [attr.height]="2 * half()"
          fill="var(--out)"
        />
        <svg:path [attr.d]="cross()" fill="none" stroke="var(--sheet)" [attr.stroke-width]="pen()" />
      }
      @case ('too-close') {
        <svg:circle
          [attr.r]="radius() * 0.88"
          fill="var(--sheet)"
          stroke="var(--close)"
          [attr.stroke-width]="radius() * 0.26"
        />
        <svg:path [attr.d]="halfDisc()" fill="var(--close)" />
      }
      @case ('not-judged') {
        <svg:path [attr.d]="diamond()" fill="var(--sheet)" stroke="var(--ink-2)" [attr.stroke-width]="pen()" />
      }
      @case ('not-measured') {
        <svg:circle [attr.r]="radius() * 0.84" fill="var(--sheet)" stroke="var(--ink-2)" [attr.stroke-width]="pen()" />
        <svg:path [attr.d]="bar()" fill="none" stroke="var(--ink-2)" [attr.stroke-width]="pen()" />
      }
      @default {
        <svg:circle [attr.r]="radius() * 0.66" fill="var(--ink-2)" />
      }
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ResultShape {
  readonly result = input.required<ShownResult>();
  /** Half the shape's size, in the drawing's units. */
  readonly radius = input(13);

  protected readonly half = computed(() => this.radius() * 0.92);
  protected readonly pen = computed(() => Math.max(1.6, this.radius() * 0.24));
  protected readonly tick = computed(() => {
    const r = this.radius();
    return `M${-r * 0.48} ${r * 0.02}l${r * 0.34} ${r * 0.36} ${r * 0.62} ${-r * 0.74}`;
  });
  protected readonly cross = computed(() => {
    const r = this.radius() * 0.42;
    return `M${-r} ${-r}L${r} ${r}M${r} ${-r}L${-r} ${r}`;
  });
  protected readonly halfDisc = computed(() => {
    const r = this.radius() * 0.78;
    return `M0 ${-r}a${r} ${r} 0 0 1 0 ${2 * r}z`;
  });
  protected readonly diamond = computed(() => {
    const r = this.radius() * 0.86;
    return `M0 ${-r}L${r} 0L0 ${r}L${-r} 0z`;
  });
  protected readonly bar = computed(() => `M${-this.radius() * 0.38} 0h${this.radius() * 0.76}`);
}
