import { analyseScreenWithProgress, type ScreenTask } from './analyseScreen';
import { dismiss, type WrittenScreen } from './shareParts';

/** Analyses one stored screen in a thread of its own. */
export default function runScreen(task: ScreenTask): WrittenScreen {
  try {
    return analyseScreenWithProgress(task);
  } finally {
    dismiss(task.helpers ?? []);
  }
}
