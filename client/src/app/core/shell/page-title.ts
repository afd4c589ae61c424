import { Injectable, inject } from '@angular/core';
import { Title } from '@angular/platform-browser';
import { TitleStrategy, type RouterStateSnapshot } from '@angular/router';

/** Names the page first and the product after it; a page without a title of its own has the product's. */
@Injectable()
export class PageTitle extends TitleStrategy {
  private readonly title = inject(Title);
  private readonly product = $localize`Lampline`;

  override updateTitle(snapshot: RouterStateSnapshot): void {
    const page = this.buildTitle(snapshot);
    if (!page) this.title.setTitle(this.product);
    else this.title.setTitle(page.includes(this.product) ? page : `${page} · ${this.product}`);
  }
}
