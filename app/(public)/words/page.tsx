import type { Metadata } from 'next';
import type { ReactElement } from 'react';
import { WordList } from '@/components/notes/word-list';
import { PageHeading } from '@/components/ui/page-heading';
import { words } from '@/lib/kernel/words';
import { listWords } from '@/lib/notes/list-words';

export const metadata: Metadata = { title: words('notes.words.title'), description: words('notes.words.description') };

export default function WordsPage(): ReactElement {
  return (
    <div className="max-w-text">
      <PageHeading>{words('notes.words.title')}</PageHeading>
      <p className="mt-4">{words('notes.words.lead')}</p>
      <WordList entries={listWords()} />
    </div>
  );
}
