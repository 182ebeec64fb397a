import type { EntryFault } from '@/lib/checks/domain/entry';
import { words } from '@/lib/kernel/words';
import { findQuestion } from '@/lib/checks/domain/steps';
import { questionWords } from './question-words';

/** What is wrong with an answer and how to mend it, in one sentence: the same beside the field and in the summary. */
export function faultWords({ question, why }: EntryFault): string {
  const kind = findQuestion(question)?.kind;
  const typed = why === 'nothing-said' && (kind === 'amount' || kind === 'money');
  return words(`checks.faults.${typed ? 'nothing-typed' : why}`, { question: questionWords(question, 'short') });
}
