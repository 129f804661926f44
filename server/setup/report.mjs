/** A reason to stop that the operator can mend; its message is all they need. */
export class CannotSetUp extends Error {
  name = 'CannotSetUp';
}

export function say(sentence) {
  console.log(`Siltline: ${sentence}`);
}
