import type { BodyInputOf, QueryInputOf } from '#shared/contracts/endpoint';
import * as contract from '#shared/contracts/versions';
import { call } from '@/api/call';

type VersionOf = Pick<contract.Version, 'kind' | 'number'>;

const paramsOf = (studyId: string, { kind, number }: VersionOf) => ({
  studyId,
  kind,
  number: String(number),
});

export const listVersions = (studyId: string, query: QueryInputOf<typeof contract.listVersions>) =>
  call(contract.listVersions, { params: { studyId }, query });

export const readVersion = (studyId: string, version: VersionOf) =>
  call(contract.readVersion, { params: paramsOf(studyId, version) });

export const nameVersion = (
  studyId: string,
  version: VersionOf,
  body: BodyInputOf<typeof contract.nameVersion>,
) => call(contract.nameVersion, { params: paramsOf(studyId, version), body });
