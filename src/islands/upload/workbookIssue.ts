import type { UploadAnswer } from '../../contracts/screens';

/** A fault or caution of a workbook, with the sheet and cell where it stands. */
export type WorkbookIssue = UploadAnswer['cautions'][number];
