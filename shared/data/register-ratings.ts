import type { Midi } from '#shared/units';

/** How consonant listeners found a chord of four notes in one register, 0 … 10. */
export interface RegisterRating {
  readonly name: string;
  readonly midi: readonly Midi[];
  /** The study's registers, 1 the lowest; not those of the pitch axis. */
  readonly register: number;
  readonly rating: number;
}

/**
 * The mean ratings of 59 listeners for three tetrads in several registers.
 * @source Eerola & Lahdelma, Register impacts perceptual consonance through roughness and sharpness, Psychonomic
 *   Bulletin & Review (journal from memory); computed from the authors' published data
 */
export const REGISTER_RATINGS: readonly RegisterRating[] = [
  { name: '3-11B.R1', midi: [28, 32, 35, 40], register: 1, rating: 2.7627 },
  { name: '3-11B.R2', midi: [38, 42, 45, 50], register: 2, rating: 3.6441 },
  { name: '3-11B.R3', midi: [48, 52, 55, 60], register: 3, rating: 6.4746 },
  { name: '3-11B.R5', midi: [68, 72, 75, 80], register: 5, rating: 7.8644 },
  { name: '3-11B.R6', midi: [78, 82, 85, 90], register: 6, rating: 7.6949 },
  { name: '3-11B.R7', midi: [88, 92, 95, 100], register: 7, rating: 6.8136 },
  { name: '3-7A.R1', midi: [27, 34, 36, 39], register: 1, rating: 2.2881 },
  { name: '3-7A.R2', midi: [37, 44, 46, 49], register: 2, rating: 3.6102 },
  { name: '3-7A.R3', midi: [47, 54, 56, 59], register: 3, rating: 3.5932 },
  { name: '3-7A.R4', midi: [57, 64, 66, 69], register: 4, rating: 5.7966 },
  { name: '3-7A.R5', midi: [67, 74, 76, 79], register: 5, rating: 7.1695 },
  { name: '3-7A.R6', midi: [77, 84, 86, 89], register: 6, rating: 6.1695 },
  { name: '3-7A.R7', midi: [87, 94, 96, 99], register: 7, rating: 5.8983 },
  { name: '4-20.R1', midi: [30, 31, 35, 38], register: 1, rating: 2.4407 },
  { name: '4-20.R2', midi: [40, 41, 45, 48], register: 2, rating: 3.0508 },
  { name: '4-20.R3', midi: [50, 51, 55, 58], register: 3, rating: 4.6102 },
  { name: '4-20.R4', midi: [60, 61, 65, 68], register: 4, rating: 6.0339 },
  { name: '4-20.R5', midi: [70, 71, 75, 78], register: 5, rating: 5.5593 },
  { name: '4-20.R6', midi: [80, 81, 85, 88], register: 6, rating: 5.322 },
  { name: '4-20.R7', midi: [90, 91, 95, 98], register: 7, rating: 4.8136 },
];

/** Registers 1 to 5: above them sharpness, not mud, is what listeners mark down. */
export const MUDDY_REGISTERS = 5;
