import { z } from 'zod';
import { emailSchema } from '#shared/contracts/accounts';
import { defineEndpoint } from '#shared/contracts/endpoint';
import { idSchema } from '#shared/contracts/ids';
import { studyParams } from '#shared/contracts/studies';

export const SHARE_RIGHTS = ['view', 'comment'] as const;
export const shareSchema = z.object({
  id: z.string(),
  email: z.string(),
  may: z.enum(SHARE_RIGHTS),
  sharedAt: z.iso.datetime(),
});
export type Share = z.infer<typeof shareSchema>;

export const listShares = defineEndpoint({
  method: 'GET',
  path: '/api/studies/:studyId/shares',
  params: studyParams,
  response: z.object({ shares: z.array(shareSchema) }),
});

/** Shares with an address, known or not: its owner sees the study once they have an account. Sharing again changes the right. */
export const createShare = defineEndpoint({
  method: 'POST',
  path: '/api/studies/:studyId/shares',
  params: studyParams,
  body: z.strictObject({ email: emailSchema, may: z.enum(SHARE_RIGHTS) }),
  response: shareSchema,
});

export const deleteShare = defineEndpoint({
  method: 'DELETE',
  path: '/api/studies/:studyId/shares/:shareId',
  params: studyParams.extend({ shareId: idSchema }),
  response: z.object({}),
});
