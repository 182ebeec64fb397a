import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { cache, type ReactElement } from 'react';
import { WordPage } from '@/components/notes/word-list';
import { slug as slugShape } from '@/lib/kernel/shapes';
import { words } from '@/lib/kernel/words';
import { readWord, type ReadWord } from '@/lib/notes/read-word';

type Props = { readonly params: Promise<{ readonly slug: string }> };

const findWord = cache(async (slug: string): Promise<ReadWord | null> => {
  if (!slugShape.safeParse(slug).success) return null;
  const found = await readWord(slug);
  return found.ok ? found.value : null;
});

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const found = await findWord((await params).slug);
  if (found === null) return {};
  const { name, definition } = found.word;
  return { title: `${name} – ${words('notes.words.title')}`, description: definition };
}

export default async function WordOfSlugPage({ params }: Props): Promise<ReactElement> {
  const found = await findWord((await params).slug);
  if (found === null) notFound();
  return <WordPage word={found.word} see={found.see} notes={found.notes.map(({ slug, title }) => ({ href: `/notes/${slug}`, title }))} />;
}
