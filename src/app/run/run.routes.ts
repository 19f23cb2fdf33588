import type { Routes } from '@angular/router';
import { RunPage } from './run-page';

export const routes: Routes = [{ path: ':runId', component: RunPage }];
