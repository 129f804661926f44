import { z } from 'zod';

/** What the server names a thing by: a UUID or 128 random bits, base64url. Anything else names nothing. */
export const idSchema = z.string().regex(/^[A-Za-z0-9_-]{16,36}$/, 'this names nothing here');
