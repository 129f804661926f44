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
/** From one place 60 guesses an hour at the most. */
const LONGEST_DELAY_MS = MINUTE_MS;
/** From everywhere together; short, as strangers could otherwise keep the owner of an account waiting. */
const LONGEST_SHARED_DELAY_MS = 8 * SECOND_MS;

function growingTo(longestMs: number): LimitRule['delayMs'] {
  return (beyondFree) => Math.min(longestMs, SHORTEST_DELAY_MS * 2 ** (beyondFree - 1));
}

/** Guesses at one account's password from one address: a delay that grows, and nobody else's. */
export const SIGN_IN_FROM_ADDRESS: LimitRule = {
  name: 'sign-in per account and address',
  free: 5,
  windowMs: HOUR_MS,
  sliding: true,
  delayMs: growingTo(LONGEST_DELAY_MS),
};

/** Guesses at one account's password from wherever: many addresses together are slowed too, though later. */
export const SIGN_IN_PER_ACCOUNT: LimitRule = {
  name: 'sign-in per account',
  free: 30,
  windowMs: HOUR_MS,
  sliding: true,
  delayMs: growingTo(LONGEST_SHARED_DELAY_MS),
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

/** Mail to one mailbox that is asked for from one address: a stranger's requests do not use up the owner's. */
export const MAIL_FROM_ADDRESS = perHour('mail per mailbox and address', 5);
/** Mail to one mailbox that is asked for from wherever. */
export const MAIL_PER_MAILBOX = perHour('mail per mailbox', 20);
/** Mail about shared studies that one person causes, in all and to one mailbox. */
export const SHARES_PER_PERSON = perHour('shares per person', 200);
export const SHARES_PER_MAILBOX = perHour('shares per person and mailbox', 10);
