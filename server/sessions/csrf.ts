import { csrfSync } from 'csrf-sync';

/** 128 random bytes in hex. A new session has a new token: the client fetches it again after sign-in and sign-out. */
const { csrfSynchronisedProtection, generateToken } = csrfSync({
  getTokenFromRequest: (req) => {
    const token = req.headers['x-csrf-token'];
    return typeof token === 'string' ? token : undefined;
  },
});

/** Refuses every changing request that does not carry its session's token. */
export const csrfProtection = csrfSynchronisedProtection;
export const csrfTokenFor = generateToken;
