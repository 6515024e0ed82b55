/** The first pass of a process over 960 series, printed in milliseconds. */
import { benchSeries } from './benchSeries';
import { fitAll, prepare } from './engineFits';
import { timeOf } from './measure';

const prepared = prepare(benchSeries(960, 40));
const laws = process.argv[2] === '4' ? 4 : 3;
console.log(timeOf(() => fitAll(prepared, laws)));
