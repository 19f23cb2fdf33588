import type { Routes } from '@angular/router';

/** One lazy route per feature. */
export const routes: Routes = [];
