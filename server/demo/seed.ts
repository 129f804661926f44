import { randomUUID } from 'node:crypto';
import { insertAccount } from '#server/accounts/accounts.repository';
import { randomSecret } from '#server/accounts/secrets';
import { insertAnnotation } from '#server/annotations/annotations.repository';
import type { Transaction } from '#server/db/connection';
import { inTransaction } from '#server/db/transaction';
import { buildDemoDocument } from '#server/demo/documents';
import { DEMO_PASSWORD, DEMO_PEOPLE_BY_ID } from '#server/demo/people';
import { DEMO_STUDIES, type DemoPerson, type DemoStudy } from '#server/demo/scenario';
import type { Deps } from '#server/deps';
import { insertShare } from '#server/shares/shares.repository';
import { insertSave } from '#server/studies/saves.repository';
import { insertStudy } from '#server/studies/studies.repository';

const MINUTE_MS = 60_000;
const DAY_MS = 1440 * MINUTE_MS;

type AccountIds = ReadonlyMap<DemoPerson, string>;

function idOf(accountIds: AccountIds, person: DemoPerson): string {
  const id = accountIds.get(person);
  if (id === undefined) throw new Error(`the demo knows nobody called ${person}`);
  return id;
}

async function seedPeople(tx: Transaction, passwordHash: string, now: Date): Promise<AccountIds> {
  const ids = new Map<DemoPerson, string>();
  for (const [person, { name, email, role }] of Object.entries(DEMO_PEOPLE_BY_ID)) {
    const id = randomSecret();
    await insertAccount(tx, { id, email, name, role, passwordHash, confirmedAt: now, createdAt: now });
    // The keys of a record typed by DemoPerson are its people.
    ids.set(person as DemoPerson, id);
  }
  return ids;
}

async function seedStudy(
  tx: Transaction,
  people: AccountIds,
  study: DemoStudy,
  savedAt: Date,
): Promise<void> {
  const studyId = randomSecret();
  const savedBy = idOf(people, study.owner);
  const document = buildDemoDocument(study);
  const row = { id: studyId, ownerId: savedBy, requestKey: randomUUID(), now: savedAt, document };
  await insertStudy(tx, row);
  const save = { studyId, basedOn: 0, document, savedBy, savedAt, requestKey: randomUUID() };
  await insertSave(tx, save, { kind: 'accepted', number: 1 });
  for (const share of study.shares) {
    const { email } = DEMO_PEOPLE_BY_ID[share.with];
    await insertShare(tx, { id: randomSecret(), studyId, email, may: share.may, sharedAt: savedAt });
  }
  for (const [index, { by, chord, text }] of study.remarks.entries()) {
    const chordId = chord === undefined ? null : (document.chords[chord]?.id ?? null);
    const writtenAt = new Date(savedAt.getTime() + (index + 1) * MINUTE_MS);
    const authorId = idOf(people, by);
    const id = randomSecret();
    await insertAnnotation(tx, { id, studyId, authorId, requestKey: randomUUID(), chordId, text, writtenAt });
  }
}

/** Fills an empty database with the scenario, whole or not at all. No mail is written. */
export async function seedDemo({
  db,
  passwords,
  clock,
  log,
}: Pick<Deps, 'db' | 'passwords' | 'clock' | 'log'>): Promise<void> {
  const now = clock();
  const passwordHash = await passwords.hash(DEMO_PASSWORD);
  await inTransaction(db, async (tx) => {
    const people = await seedPeople(tx, passwordHash, now);
    for (const [index, study] of DEMO_STUDIES.entries()) {
      await seedStudy(tx, people, study, new Date(now.getTime() - (index + 1) * DAY_MS));
    }
  });
  log.info({ people: Object.keys(DEMO_PEOPLE_BY_ID).length, studies: DEMO_STUDIES.length }, 'demo seeded');
}
