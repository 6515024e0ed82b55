/** Simulates, judges, prints the table of the calibration and keeps it in the repository. */
import { writeFileSync } from 'node:fs';
import { calibrate, FULL_SIZE } from '../calibration/calibrate';
import { writeTable } from '../calibration/writeTable';

const table = writeTable(calibrate(FULL_SIZE));
writeFileSync(new URL('../calibration/calibration.md', import.meta.url), table);
console.log(table);
