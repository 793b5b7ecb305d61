import { database } from '../models/database';
import { Person } from '../models/people';
import { passwordFits } from './passwords';

/** What a sign-in knows about its person; no password, no team. */
export type Account = { id: string; name: string; email: string; noticeReadAt: Date | null };

export function accountOf(person: Person): Account {
  return { id: person.id, name: person.name, email: person.email, noticeReadAt: person.noticeReadAt };
}

/** The account that an e-mail (lower case) and a password belong to. ASVS 5.0 6.3.8: an unknown one takes as long. */
export async function accountWith(email: string, password: string): Promise<Account | null> {
  const person = await Person.findOne({ where: { email } });
  const fits = await passwordFits(person?.passwordHash ?? null, password);
  return person && fits ? accountOf(person) : null;
}

export async function accountById(id: string): Promise<Account | null> {
  const person = await Person.findByPk(id);
  return person && accountOf(person);
}

/** Ends every sign-in of a person, on every device. */
export async function endSignInsOf(personId: string): Promise<void> {
  await database().query(`delete from sign_ins where sess -> 'passport' ->> 'user' = :personId`, {
    replacements: { personId },
  });
}

/** Removes the rows of sign-ins whose time is over; asked at each new one, so that they never pile up. */
export async function sweepSignIns(): Promise<void> {
  await database().query('delete from sign_ins where expire < now()');
}
