import type { z } from 'zod';
import type { listDemoPeople } from '#shared/contracts/demo';
import type { DemoPerson } from '#server/demo/scenario';

/** Somebody that the demonstration can be entered as; the password is for everybody to read. */
export type DemoEntry = z.infer<typeof listDemoPeople.response>['people'][number];

export const DEMO_PASSWORD = 'slack water at six';

const person = (name: string, role: DemoEntry['role'], email: string, about: string): DemoEntry => ({
  name,
  role,
  email: `${email}@saltern.example`,
  about,
  password: DEMO_PASSWORD,
});

/** Invented; `.example` is reserved and belongs to nobody (RFC 2606). */
export const DEMO_PEOPLE_BY_ID: Readonly<Record<DemoPerson, DemoEntry>> = {
  isolde: person(
    'Isolde Marchbank',
    'teacher',
    'isolde',
    'teaches writing for strings at the Saltern School of Music, Averhythe',
  ),
  corin: person('Corin Wexley', 'composer', 'corin', 'scores a film about a tidal lock'),
  petra: person('Petra Lundqvist', 'student', 'petra', 'second year, plays the cello'),
  jonah: person('Jonah Ashdown', 'student', 'jonah', 'first year, likes it dark'),
  wen: person('Wen Harrowgate', 'student', 'wen', 'first year, may look at one study only'),
  hal: person('Hal Brennock', 'administrator', 'hal', 'keeps the accounts in order, reads no studies'),
};

/** In the order in which the sign-in page offers them. */
export const DEMO_PEOPLE: readonly DemoEntry[] = Object.values(DEMO_PEOPLE_BY_ID);
