import type { Metadata } from 'next';
import type { ReactElement } from 'react';
import { NoteFinder, NoteList } from '@/components/notes/note-list';
import { PageHeading } from '@/components/ui/page-heading';
import { words } from '@/lib/kernel/words';
import { listNotes } from '@/lib/notes/list-notes';

export const metadata: Metadata = { title: words('notes.title'), description: words('notes.description') };

export default async function NotesPage(): Promise<ReactElement> {
  return (
    <div className="max-w-text">
      <PageHeading>{words('notes.title')}</PageHeading>
      <p className="mt-4">{words('notes.lead')}</p>
      <p className="mt-4">{words.rich('notes.toWords', { words: (said) => <a href="/words">{said}</a> })}</p>
      <div className="not-in-print mt-6">
        <NoteFinder />
      </div>
      <NoteList notes={await listNotes()} />
    </div>
  );
}
