import { z } from 'zod';
import { defineEndpoint } from '#shared/contracts/endpoint';

export const ROLES = ['composer', 'teacher', 'student', 'administrator'] as const;
export type Role = (typeof ROLES)[number];
/** The roles that one can take at sign-up; an administrator is made by a command. */
export const SIGN_UP_ROLES = ['composer', 'teacher', 'student'] as const;

export const MIN_PASSWORD = 8;
export const MAX_PASSWORD = 256;

/** Space around it is a slip of the hand and is taken off. */
export const emailSchema = z
  .string()
  .trim()
  .max(254, 'an e-mail address has at most 254 characters')
  .pipe(z.email('this does not look like an e-mail address'));
export const passwordSchema = z
  .string()
  .min(MIN_PASSWORD, `a password has at least ${MIN_PASSWORD} characters`)
  .max(MAX_PASSWORD, `a password has at most ${MAX_PASSWORD} characters`);
export const personNameSchema = z
  .string()
  .trim()
  .min(1, 'please give a name')
  .max(80, 'a name has at most 80 characters')
  // eslint-disable-next-line no-control-regex -- line breaks in a name would reach mail headers
  .regex(/^[^\u0000-\u001f\u007f]*$/, 'a name is one line');
/** A secret from a mailed link: 128 random bits, base64url. */
export const tokenSchema = z.string().regex(/^[A-Za-z0-9_-]{22}$/, 'this link is not complete');

export const accountSchema = z.object({
  id: z.string(),
  name: z.string(),
  email: z.string(),
  role: z.enum(ROLES),
});
export type Account = z.infer<typeof accountSchema>;

const nothing = z.object({});

/** Who is signed in, and whether this is the demonstration. */
export const readSession = defineEndpoint({
  method: 'GET',
  path: '/api/session',
  response: z.object({ account: accountSchema.nullable(), demo: z.boolean() }),
});

/** The token that every changing request carries in `x-csrf-token`; it changes at sign-in and sign-out. */
export const readCsrfToken = defineEndpoint({
  method: 'GET',
  path: '/api/session/csrf-token',
  response: z.object({ csrfToken: z.string() }),
});

export const signIn = defineEndpoint({
  method: 'POST',
  path: '/api/session',
  body: z.strictObject({ email: emailSchema, password: z.string().min(1).max(MAX_PASSWORD) }),
  response: z.object({ account: accountSchema }),
});

export const signOut = defineEndpoint({ method: 'DELETE', path: '/api/session', response: nothing });

/** Answers alike whether or not the address is known: what differs is the mail. */
export const signUp = defineEndpoint({
  method: 'POST',
  path: '/api/accounts',
  body: z.strictObject({
    email: emailSchema,
    name: personNameSchema,
    password: passwordSchema,
    role: z.enum(SIGN_UP_ROLES),
  }),
  response: nothing,
});

/** Sends the confirmation again; answers alike whether or not the address is known. */
export const requestConfirmation = defineEndpoint({
  method: 'POST',
  path: '/api/confirmation-requests',
  body: z.strictObject({ email: emailSchema }),
  response: nothing,
});

/** Asks for the password too, since whoever reads the mail need not be who signed up; then it signs in at once. */
export const confirmAccount = defineEndpoint({
  method: 'POST',
  path: '/api/confirmations',
  body: z.strictObject({ token: tokenSchema, password: z.string().min(1).max(MAX_PASSWORD) }),
  response: z.object({ account: accountSchema }),
});

export const requestPasswordReset = defineEndpoint({
  method: 'POST',
  path: '/api/password-reset-requests',
  body: z.strictObject({ email: emailSchema }),
  response: nothing,
});

export const resetPassword = defineEndpoint({
  method: 'POST',
  path: '/api/password-resets',
  body: z.strictObject({ token: tokenSchema, password: passwordSchema }),
  response: nothing,
});
