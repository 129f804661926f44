import { expect, test } from 'vitest';
import { COMMON_PASSWORDS } from '#server/accounts/common-passwords';
import { passwordFault } from '#server/accounts/password-rules';

const ADA = { name: 'Ada Sandpiper', email: 'a.lovelock@people.example' };

test.each(['password', 'Password1', 'sunshine!', '2024dragon', 'qwertyuiop', '12345678'])(
  'when a password is %s, then it is among the first that are tried',
  (password) => expect(passwordFault(password, ADA)).toMatch(/first that are tried/),
);

test.each(['sandpiper', 'SANDPIPER99', 'lovelock!', 'siltline2026'])(
  'when a password is %s, then it is one that others can guess of this person',
  (password) => expect(passwordFault(password, ADA)).toMatch(/your own name/),
);

test.each(['slack water at six', 'correct horse battery staple', 'Sandpiper at low tide', 'пароль на отлив'])(
  'when a password is %s, then nothing speaks against it',
  (password) => expect(passwordFault(password, ADA)).toBeNull(),
);

test('when the list is looked at, then it has thousands and none that is too short to be asked', () => {
  expect(COMMON_PASSWORDS.size).toBeGreaterThanOrEqual(3000);
  for (const password of COMMON_PASSWORDS) expect(password.length).toBeGreaterThanOrEqual(8);
});
