import { customType, datetime } from 'drizzle-orm/mysql-core';

interface Length {
  length: number;
}

/** An id or a key of our own making: plain ASCII, compared byte by byte. */
export const idText = customType<{ data: string; config: Length; configRequired: true }>({
  dataType: ({ length }) => `varchar(${length}) character set ascii collate ascii_bin`,
});

/** Text compared exactly: no folding of case or accents, no padding with spaces. */
export const exactText = customType<{ data: string; config: Length; configRequired: true }>({
  dataType: ({ length }) => `varchar(${length}) character set utf8mb4 collate utf8mb4_nopad_bin`,
});

/** Text for people; sorted as people expect. */
export const peopleText = customType<{ data: string; config: Length; configRequired: true }>({
  dataType: ({ length }) => `varchar(${length}) character set utf8mb4 collate utf8mb4_unicode_ci`,
});

/** Longer text that nothing sorts or searches by. */
export const longText = customType<{ data: string }>({
  dataType: () => 'mediumtext character set utf8mb4 collate utf8mb4_nopad_bin',
});

/** A SHA-256 digest. */
export const digest = customType<{ data: Buffer }>({ dataType: () => 'binary(32)' });

/** UTC with milliseconds. */
export function time(name: string) {
  return datetime(name, { mode: 'date', fsp: 3 });
}

/** Ids: 16 random bytes in base64url are 22 characters; UUIDs 36. */
export const ID_LENGTH = 36;
export const EMAIL_LENGTH = 254;
