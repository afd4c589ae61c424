import type { Role } from '@shared/contract';

export const roleNames: Readonly<Record<Role, string>> = {
  technician: $localize`Technician`,
  engineer: $localize`Engineer`,
  supervisor: $localize`Supervisor`,
  administrator: $localize`Administrator`,
};
