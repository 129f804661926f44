const SECOND_MS = 1000;
const MINUTE_MS = 60 * SECOND_MS;
const HOUR_MS = 60 * MINUTE_MS;

/** How often something may be tried. */
export interface LimitRule {
  readonly name: string;
  /** So many pass without delay. */
  readonly free: number;
  /** After so long without a try the counter starts anew (`sliding`), or so long after the first one. */
  readonly windowMs: number;
  readonly sliding: boolean;
  /** How long the next try has to wait; it need not be the rest of the window. */
  readonly delayMs: (beyondFree: number) => number;
}

const SHORTEST_DELAY_MS = 2 * SECOND_MS;
/** 60 guesses an hour at the most, and whoever owns the account never waits longer than this. */
const LONGEST_DELAY_MS = MINUTE_MS;

function growing(beyondFree: number): number {
  return Math.min(LONGEST_DELAY_MS, SHORTEST_DELAY_MS * 2 ** (beyondFree - 1));
}

/** Guesses at one account's password: a delay that grows, never a lock that a stranger could turn. */
export const SIGN_IN_PER_ACCOUNT: LimitRule = {
  name: 'sign-in per account',
  free: 5,
  windowMs: HOUR_MS,
  sliding: true,
  delayMs: growing,
};

function perMinute(name: string, free: number): LimitRule {
  return { name, free, windowMs: MINUTE_MS, sliding: false, delayMs: () => MINUTE_MS };
}

function perHour(name: string, free: number): LimitRule {
  return { name, free, windowMs: HOUR_MS, sliding: false, delayMs: () => HOUR_MS };
}

/** A school comes from one address: a class of 30 signs in, or up, within a minute without waiting. */
export const SIGN_IN_PER_ADDRESS = perMinute('sign-in per address', 60);
export const SIGN_UP_PER_ADDRESS = perMinute('sign-up per address', 60);
export const LINK_PER_ADDRESS = perMinute('link per address', 60);
/** What scripts and lessons ask to be computed: ten a second, a class of 30 each one every three seconds. */
export const SCRIPT_CALLS_PER_ADDRESS = perMinute('script calls per address', 600);

/** Mail that a stranger can cause to one mailbox. */
export const MAIL_PER_MAILBOX = perHour('mail per mailbox', 5);
/** Mail about shared studies that one person causes, in all and to one mailbox. */
export const SHARES_PER_PERSON = perHour('shares per person', 200);
export const SHARES_PER_MAILBOX = perHour('shares per person and mailbox', 10);
