import type { Role } from '../shared/contract';

/** One demo account, as `npm start` prints it. */
export interface DemoAccount {
  readonly role: Role;
  readonly name: string;
  readonly email: string;
  readonly password: string;
}

/** Easy to type on a phone, long enough for the rules; demo only. */
const PASSWORD = 'lamp at the end';

const account = (role: Role, name: string, email: string): DemoAccount => ({
  role,
  name,
  email,
  password: PASSWORD,
});

/** An invented company with invented people. */
export const firstCompanyAccounts: readonly DemoAccount[] = [
  account('technician', 'Jonas Wetherby', 'jonas@fennimore.example'),
  account('technician', 'Adaeze Brook', 'adaeze@fennimore.example'),
  account('engineer', 'Tove Lindqvar', 'tove@fennimore.example'),
  account('supervisor', 'Ruth Amsel', 'ruth@fennimore.example'),
  account('administrator', 'Pavel Orme', 'pavel@fennimore.example'),
];

/** And a second one, which never sees the first. */
export const secondCompanyAccounts: readonly DemoAccount[] = [
  account('technician', 'Mira Holloway', 'mira@caldervale.example'),
  account('supervisor', 'Idris Penn', 'idris@caldervale.example'),
  account('administrator', 'Sofie Carrow', 'sofie@caldervale.example'),
];
