import type { Role } from '#shared/contracts/accounts';

/** How a person stands to a study, from the strongest to none. */
export const RELATIONS = ['owner', 'comment', 'view', 'stranger'] as const;
export type Relation = (typeof RELATIONS)[number];

/** What can be done to a study. */
export const STUDY_ACTIONS = ['read', 'save', 'delete', 'share', 'annotate', 'moderate'] as const;
export type StudyAction = (typeof STUDY_ACTIONS)[number];

const BY_RELATION: Readonly<Record<Relation, readonly StudyAction[]>> = {
  owner: ['read', 'save', 'delete', 'share', 'annotate', 'moderate'],
  comment: ['read', 'annotate'],
  view: ['read'],
  stranger: [],
};

/** What a role may do at all, whatever the study. */
export const ROLE_ACTIONS = ['studies.own', 'studies.receive', 'people.administer'] as const;
export type RoleAction = (typeof ROLE_ACTIONS)[number];

const BY_ROLE: Readonly<Record<Role | 'visitor', readonly RoleAction[]>> = {
  visitor: [],
  composer: ['studies.own', 'studies.receive'],
  teacher: ['studies.own', 'studies.receive'],
  student: ['studies.own', 'studies.receive'],
  administrator: ['people.administer'],
};

/** @returns whether somebody who stands so to a study may do this to it. */
export function mayDoToStudy(relation: Relation, action: StudyAction): boolean {
  return BY_RELATION[relation].includes(action);
}

/** @returns whether a role may do this; a visitor has no account. */
export function roleMay(role: Role | 'visitor', action: RoleAction): boolean {
  return BY_ROLE[role].includes(action);
}
