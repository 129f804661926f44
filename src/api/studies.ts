import type { BodyInputOf, QueryInputOf } from '#shared/contracts/endpoint';
import * as contract from '#shared/contracts/studies';
import { call } from '@/api/call';

export const listStudies = (query: QueryInputOf<typeof contract.listStudies>) =>
  call(contract.listStudies, { query });

export const createStudy = (body: BodyInputOf<typeof contract.createStudy>) =>
  call(contract.createStudy, { body });

export const readStudy = (studyId: string) => call(contract.readStudy, { params: { studyId } });

export const saveStudy = (studyId: string, body: BodyInputOf<typeof contract.saveStudy>) =>
  call(contract.saveStudy, { params: { studyId }, body });

export const renameStudy = (studyId: string, body: BodyInputOf<typeof contract.renameStudy>) =>
  call(contract.renameStudy, { params: { studyId }, body });

export const deleteStudy = (studyId: string) => call(contract.deleteStudy, { params: { studyId } });

export const restoreStudy = (studyId: string) => call(contract.restoreStudy, { params: { studyId } });

export const readStudyFilters = () => call(contract.readStudyFilters, {});

export const setStudyTags = (studyId: string, body: BodyInputOf<typeof contract.setStudyTags>) =>
  call(contract.setStudyTags, { params: { studyId }, body });

export const duplicateStudy = (studyId: string, body: BodyInputOf<typeof contract.duplicateStudy>) =>
  call(contract.duplicateStudy, { params: { studyId }, body });

export const listDeletedStudies = (query: QueryInputOf<typeof contract.listDeletedStudies>) =>
  call(contract.listDeletedStudies, { query });
