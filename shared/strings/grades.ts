/** How playable something is; never a reason to refuse it. */
export const GRADES = ['easy', 'awkward', 'not playable'] as const;
export type Grade = (typeof GRADES)[number];

/** A grade with its reason, in the words of players. */
export interface GradedFinding {
  readonly grade: Grade;
  readonly reason: string;
}

/** @returns the less playable of two findings; the first where they are alike */
export function lessPlayable(a: GradedFinding, b: GradedFinding): GradedFinding {
  return GRADES.indexOf(b.grade) > GRADES.indexOf(a.grade) ? b : a;
}

/** @returns the more playable of two findings; the first where they are alike */
export function morePlayable(a: GradedFinding, b: GradedFinding): GradedFinding {
  return GRADES.indexOf(b.grade) < GRADES.indexOf(a.grade) ? b : a;
}
