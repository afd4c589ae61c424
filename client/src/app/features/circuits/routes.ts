import type { Routes } from '@angular/router';

export const circuitRoutes: Routes = [];
