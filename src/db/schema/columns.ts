import { char, customType, datetime } from 'drizzle-orm/mysql-core';

/** A UUID as text; compared byte for byte. */
export const uuid = customType<{ data: string; driverData: string }>({
  dataType: () => 'char(36) character set ascii collate ascii_bin',
});

/**
 * Text whose letter case and trailing spaces matter, such as catalyst codes (CO is not Co). MariaDB's
 * default collation would take both for the same.
 */
export const exactText = customType<{
  data: string;
  driverData: string;
  config: { length: number };
}>({
  dataType: (config) =>
    `varchar(${config?.length ?? 64}) character set utf8mb4 collate utf8mb4_nopad_bin`,
});

/** Bytes up to 16 MB. */
export const mediumBytes = customType<{ data: Buffer; driverData: Buffer }>({
  dataType: () => 'mediumblob',
});

/** Bytes up to 4 GB; here the original workbooks. */
export const longBytes = customType<{ data: Buffer; driverData: Buffer }>({
  dataType: () => 'longblob',
});

/** SHA-256 in lower-case hexadecimal. */
export const sha256 = () => char({ length: 64 });

/** An instant, UTC, with milliseconds. */
export const instant = () => datetime({ mode: 'date', fsp: 3 });
