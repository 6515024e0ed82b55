import { helpWithWells, type Helper } from './sharedWells';

/** Fits wells for a batch or a screen that another thread answers. */
export default function runHelper(helper: Helper): Promise<void> {
  return helpWithWells(helper);
}
