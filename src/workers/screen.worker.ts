import type { ScreenAnalysis } from '../kinetics/types';
import { analyseScreenWithProgress, type ScreenTask } from './analyseScreen';
import { dismiss } from './sharedWells';

/** Analyses one stored screen in a thread of its own. */
export default function runScreen(task: ScreenTask): ScreenAnalysis {
  try {
    return analyseScreenWithProgress(task);
  } finally {
    dismiss(task.helpers ?? []);
  }
}
