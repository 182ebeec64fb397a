import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import type { ReactElement } from 'react';
import { RuleDoubts } from '@/components/doubts/rule-doubts';
import { RulePage } from '@/components/regions/rule-page';
import { calendarDateOf } from '@/lib/kernel/calendar-date';
import { words } from '@/lib/kernel/words';
import { namesOf } from '@/lib/regions/domain/sheet-names';
import { contactsOf } from '@/lib/regions/domain/sheet-reading';
import { readRegionSheet } from '@/lib/regions/read-region-sheet';
import { readRuleDoubts } from '@/lib/regions/list-doubts';
import { readRuleNeighbours } from '@/lib/regions/read-rule-neighbours';
import { makeCtx } from '@/lib/server/ctx';
import { findRule } from './find-rule';

type Props = { readonly params: Promise<{ readonly id: string }> };

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const found = await findRule((await params).id);
  if (found === null) return {};
  const said = { title: found.rule.title, region: found.sheet.name };
  return { title: words('regions.rule.titleOf', said), description: words('regions.rule.description', said) };
}

export default async function RuleOfIdPage({ params }: Props): Promise<ReactElement> {
  const found = await findRule((await params).id);
  if (found === null) notFound();
  const ctx = makeCtx();
  const [home, neighbours, doubts] = await Promise.all([
    readRegionSheet(ctx, { code: found.sheet.code }),
    readRuleNeighbours(ctx, found.rule),
    readRuleDoubts(ctx, found.rule.id),
  ]);
  const sheet = home.ok ? home.value : null;
  return (
    <RulePage
      rule={found.rule}
      sheet={found.sheet}
      edition={found.edition}
      withdrawn={found.withdrawn}
      names={namesOf(sheet === null ? [] : [sheet, ...sheet.above])}
      neighbours={neighbours}
      authority={sheet === null ? null : (contactsOf(sheet, 'authorities')[0] ?? null)}
      today={calendarDateOf(ctx.now)}
      doubts={<RuleDoubts {...doubts} />}
    />
  );
}
