import { parseWorkbook } from '../workbooks/parseWorkbook';
import type { ParsedWorkbook } from '../workbooks/types';

/** Reads one workbook in a thread of its own, where memory and time are bounded by the caller. */
export default function readWorkbook(input: {
  bytes: Uint8Array;
  fileName: string;
}): Promise<ParsedWorkbook> {
  return parseWorkbook(input.bytes, input.fileName);
}
