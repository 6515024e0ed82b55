/** Prints how fast the engine is, as ratios of one run. */
import { join } from 'node:path';
import { benchLargestBatch, benchPool } from './allCores';
import { benchOneCore } from './oneCore';
import { startScipy } from './scipy';

const [folder, root] = process.argv.slice(2) as [string, string];

console.log('One core, 960 series of 40 readings, each law with errors, AICc and interval:');
const scipy = await startScipy(join(root, 'src/cli/bench/scipyFits.py'));
if (scipy === null) console.log('SciPy is not installed (Debian: python3-scipy); left out.');
for (const text of await benchOneCore(folder, scipy)) console.log(text);
scipy?.end();
console.log('All cores:');
for (const text of await benchPool(folder)) console.log(text);
console.log('The largest batch:');
for (const text of await benchLargestBatch(folder)) console.log(text);
