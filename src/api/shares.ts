import type { BodyInputOf } from '#shared/contracts/endpoint';
import * as contract from '#shared/contracts/shares';
import { call } from '@/api/call';

export const listShares = (studyId: string) => call(contract.listShares, { params: { studyId } });

export const createShare = (studyId: string, body: BodyInputOf<typeof contract.createShare>) =>
  call(contract.createShare, { params: { studyId }, body });

export const deleteShare = (studyId: string, shareId: string) =>
  call(contract.deleteShare, { params: { studyId, shareId } });
