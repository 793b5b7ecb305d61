import type { DemoPerson } from './shapes';

/** Nobody of these exists; `.example` can never receive mail (RFC 2606). */
const person = (slug: string, name: string): DemoPerson => ({ slug, name, email: `${slug}@apple-loft.example` });

export const people = [
  person('wilma', 'Wilma Tarrowby'),
  person('dario', 'Dario Penhallick'),
  person('sunniva', 'Sunniva Krellborn'),
  person('bo', 'Bo Achterwold'),
  person('ngaire', 'Ngaire Tullamere'),
  person('oskar', 'Oskar Fennimoor'),
  person('halima', 'Halima Strowde'),
  person('teun', 'Teun Whitlowe'),
  person('pia', 'Pia Larkmarsh'),
  person('jonty', 'Jonty Merrydew'),
  person('ravenna', 'Ravenna Oxtoby-Lisle'),
] as const satisfies readonly DemoPerson[];

/** Every person of the demo signs in with it: long enough for the rule, printed at start, never used elsewhere. */
export const demoPassword = 'apples on the beam';
