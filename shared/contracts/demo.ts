import { z } from 'zod';
import { ROLES } from '#shared/contracts/accounts';
import { defineEndpoint } from '#shared/contracts/endpoint';

/** How to enter the demonstration as each role; 404 outside it. */
export const listDemoPeople = defineEndpoint({
  method: 'GET',
  path: '/api/demo/people',
  response: z.object({
    people: z.array(
      z.object({
        name: z.string(),
        role: z.enum(ROLES),
        about: z.string(),
        email: z.string(),
        password: z.string(),
      }),
    ),
  }),
});

export const mailSchema = z.object({
  id: z.string(),
  to: z.string(),
  from: z.string(),
  subject: z.string(),
  text: z.string(),
  receivedAt: z.iso.datetime(),
});
export type Mail = z.infer<typeof mailSchema>;

/** The mail that the demonstration would have sent, newest first; 404 outside it. */
export const listMails = defineEndpoint({
  method: 'GET',
  path: '/api/demo/mails',
  response: z.object({ mails: z.array(mailSchema) }),
});
