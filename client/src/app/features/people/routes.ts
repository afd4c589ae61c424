import type { Routes } from '@angular/router';

export const peopleRoutes: Routes = [];
