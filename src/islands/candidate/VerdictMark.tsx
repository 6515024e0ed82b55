import type { Verdict } from '../../kinetics/types';

const words: Record<Verdict, string> = {
  zero: 'zero order',
  first: 'first order',
  second: 'second order',
  saturating: 'saturating',
  other: 'other',
  undetermined: 'undetermined',
  'no-reaction': 'no reaction',
  unusable: 'unusable',
  forced: 'forced',
};

export function VerdictMark(props: {
  verdict: Verdict;
  order: number | null;
  word?: string;
  large?: boolean;
}) {
  return <span>{props.word ?? words[props.verdict]}</span>;
}
