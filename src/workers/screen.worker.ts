import type { ScreenAnalysis } from '../kinetics/types';
import { analyseScreenWithProgress, type ScreenTask } from './analyseScreen';

/** Analyses one stored screen in a thread of its own. */
export default function runScreen(task: ScreenTask): ScreenAnalysis {
  return analyseScreenWithProgress(task);
}
