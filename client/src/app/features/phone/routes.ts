import type { Routes } from '@angular/router';

export const phoneRoutes: Routes = [];
