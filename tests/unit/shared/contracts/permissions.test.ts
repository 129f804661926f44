import { expect, test } from 'vitest';
import { mayDoToStudy, RELATIONS, roleMay, STUDY_ACTIONS, ROLE_ACTIONS } from '#shared/contracts/permissions';

test('when a relation and an action meet, then the answer is as written here', () => {
  const table = RELATIONS.map((relation) => [
    relation,
    STUDY_ACTIONS.filter((action) => mayDoToStudy(relation, action)).join(' '),
  ]);
  expect(table).toEqual([
    ['owner', 'read save delete share annotate moderate'],
    ['comment', 'read annotate'],
    ['view', 'read'],
    ['stranger', ''],
  ]);
});

test('when a role and an action meet, then the answer is as written here', () => {
  const roles = ['visitor', 'composer', 'teacher', 'student', 'administrator'] as const;
  expect(
    roles.map((role) => [role, ROLE_ACTIONS.filter((action) => roleMay(role, action)).join(' ')]),
  ).toEqual([
    ['visitor', ''],
    ['composer', 'studies.own studies.receive'],
    ['teacher', 'studies.own studies.receive'],
    ['student', 'studies.own studies.receive'],
    ['administrator', 'people.administer'],
  ]);
});
