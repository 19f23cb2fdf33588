import { inject, Injectable } from '@angular/core';
import { Title } from '@angular/platform-browser';
import { type RouterStateSnapshot, TitleStrategy } from '@angular/router';

/** The window's title: the page's own words, then the product. */
@Injectable({ providedIn: 'root' })
export class PageTitle extends TitleStrategy {
  private readonly title = inject(Title);

  override updateTitle(snapshot: RouterStateSnapshot): void {
    const words = this.buildTitle(snapshot);
    this.title.setTitle(words === undefined ? 'Bayhand' : `${words} · Bayhand`);
  }
}
