import { help, type Helper } from './shareParts';

/** Analyses parts for a thread that answers a batch or a screen. */
export default function runHelper(helper: Helper): Promise<void> {
  return help(helper);
}
