import type { Layout } from './layout';
import { tidyTable } from './tidyTable';
import { wellsAndReadings } from './wellsAndReadings';

/** Every layout that is read; a new one is added here and nowhere else. */
export const LAYOUTS: readonly Layout[] = [wellsAndReadings, tidyTable];
