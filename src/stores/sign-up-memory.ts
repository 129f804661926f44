const SIGN_UP_KEY = 'siltline.sign-up';

/** Who signed up in this browser, until they have come in: the draft here is theirs. */
export function rememberSignUp(storage: Storage | null, email: string): void {
  storage?.setItem(SIGN_UP_KEY, email.toLowerCase());
}

export function signedUpHere(storage: Storage | null, email: string): boolean {
  return storage?.getItem(SIGN_UP_KEY) === email.toLowerCase();
}

export function forgetSignUp(storage: Storage | null): void {
  storage?.removeItem(SIGN_UP_KEY);
}
