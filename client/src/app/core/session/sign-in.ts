import { ChangeDetectionStrategy, Component, inject, input, signal } from '@angular/core';
import { FormControl, FormGroup, ReactiveFormsModule, Validators } from '@angular/forms';
import { Router } from '@angular/router';
import { Connection } from '../device/connection';
import { StorageGrant } from '../device/storage-grant';
import { LampMark } from '../shell/lamp-mark';
import { ApiError } from './api-error';
import { homeOf } from './guards';
import { SessionStore } from './session-store';

@Component({
  selector: 'app-sign-in',
  imports: [LampMark, ReactiveFormsModule],
  templateUrl: './sign-in.html',
  styleUrl: './sign-in.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SignIn {
  private readonly sessions = inject(SessionStore);
  private readonly router = inject(Router);
  private readonly grant = inject(StorageGrant);

  /** Where the person wanted to go; from the address. */
  readonly back = input<string>();

  protected readonly online = inject(Connection).online;
  protected readonly busy = signal(false);
  protected readonly problem = signal<string | undefined>(undefined);
  protected readonly tried = signal(false);
  protected readonly shown = signal(false);
  protected readonly form = new FormGroup({
    email: new FormControl('', {
      nonNullable: true,
      validators: [Validators.required, Validators.email],
    }),
    password: new FormControl('', { nonNullable: true, validators: [Validators.required] }),
  });

  protected async signIn(): Promise<void> {
    this.tried.set(true);
    this.problem.set(undefined);
    if (this.form.invalid || this.busy()) return;
    this.busy.set(true);
    const { email, password } = this.form.getRawValue();
    try {
      const { person } = await this.sessions.signIn(email.trim(), password);
      // The button was the gesture that browsers want before they promise to keep anything.
      void this.grant.ask();
      await this.router.navigateByUrl(this.target() ?? homeOf(person.role));
    } catch (error) {
      this.problem.set(error instanceof ApiError ? error.detail : $localize`This did not work.`);
    } finally {
      this.busy.set(false);
    }
  }

  /** Only a path of our own. */
  private target(): string | undefined {
    const back = this.back();
    return back?.startsWith('/') && !back.startsWith('//') ? back : undefined;
  }
}
