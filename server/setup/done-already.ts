import { faultNumber } from '#server/db/faults';

/** MariaDB's numbers for what is there, or gone, already (MariaDB Knowledge Base, "MariaDB Error Codes"). */
const ER_CANT_CREATE_TABLE = 1005;
const ALREADY = new Set([
  1050, // ER_TABLE_EXISTS_ERROR
  1051, // ER_BAD_TABLE_ERROR: the table to drop is gone
  1060, // ER_DUP_FIELDNAME
  1061, // ER_DUP_KEYNAME
  1068, // ER_MULTIPLE_PRI_KEY
  1091, // ER_CANT_DROP_FIELD_OR_KEY
  1826, // ER_DUP_CONSTRAINT_NAME
]);
/** InnoDB tells a foreign key that is there already by its own number inside a general fault. */
const INNODB_DUPLICATE = /errno: 121\b/;

/** @returns whether a change of tables failed because it was made before. */
export function isDoneAlready(error: unknown): boolean {
  const number = faultNumber(error);
  if (number === ER_CANT_CREATE_TABLE) return error instanceof Error && INNODB_DUPLICATE.test(error.message);
  return number !== null && ALREADY.has(number);
}
