import type { Routes } from '@angular/router';

export const liftRoutes: Routes = [];
