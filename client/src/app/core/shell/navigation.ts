import type { Role } from '@shared/contract';

export interface Place {
  readonly path: string;
  readonly label: string;
  /** Outline of a 24 × 24 sign. */
  readonly sign: string;
}

const cases: Place = {
  path: '/cases',
  label: $localize`Cases`,
  sign: 'M5 4h14v16H5zM9 9h6M9 13h6M9 17h3',
};
const lifts: Place = {
  path: '/lifts',
  label: $localize`Lifts`,
  sign: 'M4 3h16v18H4zM12 3v18M8 10l-1.5 2h3zM16 14l-1.5-2h3z',
};
const review: Place = {
  path: '/review',
  label: $localize`To review`,
  sign: 'M4 5h16M4 12h8M4 19h6M14 16l3 3 5-6',
};
const people: Place = {
  path: '/people',
  label: $localize`People`,
  sign: 'M12 11a4 4 0 1 0 0-8 4 4 0 0 0 0 8zM4 21c0-5 3-7 8-7s8 2 8 7',
};
const circuits: Place = {
  path: '/circuits/check',
  label: $localize`Circuits`,
  sign: 'M3 12h5M16 12h5M8 12a4 4 0 1 0 8 0 4 4 0 0 0-8 0M9.5 9.5l5 5M14.5 9.5l-5 5',
};
const practice: Place = {
  path: '/practice',
  label: $localize`Practice`,
  sign: 'M4 15a8 8 0 0 1 16 0M12 15l4-5M4 19h16',
};
const phone: Place = {
  path: '/phone',
  label: $localize`This phone`,
  sign: 'M7 2h10v20H7zM11 18.5h2',
};

/** Where each role goes; the API checks again. */
export const placesOf: Readonly<Record<Role, readonly Place[]>> = {
  technician: [cases, lifts, practice, phone],
  engineer: [cases, lifts, practice, circuits, phone],
  supervisor: [review, cases, lifts, people, phone],
  administrator: [people, lifts, circuits, phone],
};
