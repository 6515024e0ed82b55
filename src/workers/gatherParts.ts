import type { PartAnswer, WrittenResult } from './answerPart';

/** All results of a screen, in the order of its wells and of first appearance. */
export interface WrittenScreen {
  series: WrittenResult[];
  catalysts: WrittenResult[];
}

/** Puts the answers to parts back into one order. */
export function gatherParts(wells: number, answers: readonly PartAnswer[]): WrittenScreen {
  const series = new Array<WrittenResult>(wells);
  for (const answer of answers) {
    answer.places.forEach((place, i) => {
      series[place] = answer.series[i]!;
    });
  }
  const catalysts = answers
    .flatMap((answer) => answer.catalysts)
    .sort((a, b) => a.first - b.first)
    .map(({ first: _, ...written }) => written);
  return { series, catalysts };
}
