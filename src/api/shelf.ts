import type { BodyInputOf, QueryInputOf } from '#shared/contracts/endpoint';
import * as contract from '#shared/contracts/shelf';
import { call } from '@/api/call';

export const listShelf = (query: QueryInputOf<typeof contract.listShelf>) =>
  call(contract.listShelf, { query });

export const keepVoicing = (body: BodyInputOf<typeof contract.keepVoicing>) =>
  call(contract.keepVoicing, { body });

export const renameVoicing = (voicingId: string, body: BodyInputOf<typeof contract.renameVoicing>) =>
  call(contract.renameVoicing, { params: { voicingId }, body });

export const deleteVoicing = (voicingId: string) => call(contract.deleteVoicing, { params: { voicingId } });
