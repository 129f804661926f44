import * as contract from '#shared/contracts/annotations';
import type { BodyInputOf } from '#shared/contracts/endpoint';
import { call } from '@/api/call';

export const listAnnotations = (studyId: string) => call(contract.listAnnotations, { params: { studyId } });

export const createAnnotation = (studyId: string, body: BodyInputOf<typeof contract.createAnnotation>) =>
  call(contract.createAnnotation, { params: { studyId }, body });

export const deleteAnnotation = (studyId: string, annotationId: string) =>
  call(contract.deleteAnnotation, { params: { studyId, annotationId } });
