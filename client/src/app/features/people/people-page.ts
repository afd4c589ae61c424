import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import {
  personSchema,
  roles,
  routes,
  type Person,
  type PersonChange,
  type Role,
} from '@shared/contract';
import { NEW_ID } from '../../core/device/ids';
import { Api } from '../../core/session/api';
import { ApiError } from '../../core/session/api-error';
import { SessionStore } from '../../core/session/session-store';
import { PageHeader } from '../../core/shell/page-header';
import { roleNames } from '../../core/shell/role-names';

/** Who is in the organisation. An administrator changes roles and disables; a supervisor looks. */
@Component({
  selector: 'app-people-page',
  imports: [PageHeader],
  templateUrl: './people-page.html',
  styleUrl: './people-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PeoplePage {
  private readonly api = inject(Api);
  private readonly newId = inject(NEW_ID);
  private readonly sessions = inject(SessionStore);

  protected readonly people = signal<readonly Person[] | undefined>(undefined);
  /** Why the list could not be fetched. */
  protected readonly failure = signal<ApiError | undefined>(undefined);
  /** The latest change that was not taken, with the person as the server has them. */
  protected readonly problem = signal<{ id: string; sentence: string } | undefined>(undefined);
  protected readonly busy = signal<string | undefined>(undefined);
  protected readonly roles = roles.map((role) => ({ role, label: roleNames[role] }));
  protected readonly mayChange = computed(() => this.sessions.role() === 'administrator');

  constructor() {
    void this.fetch();
  }

  protected async fetch(): Promise<void> {
    this.failure.set(undefined);
    try {
      this.people.set((await this.api.call(routes.people)).people);
    } catch (error) {
      if (!(error instanceof ApiError)) throw error;
      this.failure.set(error);
    }
  }

  protected roleName(role: Role): string {
    return roleNames[role];
  }

  protected isSelf({ id }: Person): boolean {
    return id === this.sessions.session()?.person.id;
  }

  protected setRole(person: Person, role: string): Promise<void> {
    return this.change(person, { role: role as Role });
  }

  protected toggle(person: Person): Promise<void> {
    return this.change(person, { disabled: !person.disabled });
  }

  private async change(person: Person, change: PersonChange): Promise<void> {
    this.busy.set(person.id);
    this.problem.set(undefined);
    try {
      const changed = await this.api.call(routes.changePerson, {
        params: { id: person.id },
        body: change,
        version: person.version,
        key: this.newId(),
      });
      this.replace(changed);
    } catch (error) {
      if (!(error instanceof ApiError)) throw error;
      const current = personSchema.safeParse(error.details['current']);
      // Shown as it is now; the person decides again.
      this.replace(current.success ? current.data : { ...person });
      this.problem.set({ id: person.id, sentence: error.detail });
    } finally {
      this.busy.set(undefined);
    }
  }

  private replace(changed: Person): void {
    this.people.set(this.people()?.map((each) => (each.id === changed.id ? changed : each)));
  }
}
