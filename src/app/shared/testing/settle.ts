import type { ComponentFixture } from '@angular/core/testing';

/** Lets answers, the offline store's reads and the drawing that follows come to rest. For specs. */
export async function settle(fixture: ComponentFixture<unknown>): Promise<void> {
  for (let turns = 0; turns < 6; turns += 1) {
    await new Promise((resolve) => setTimeout(resolve, 2));
    await fixture.whenStable();
  }
}
