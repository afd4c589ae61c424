import type { Routes } from '@angular/router';

export const reviewRoutes: Routes = [];
