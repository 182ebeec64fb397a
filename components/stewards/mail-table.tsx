import type { ReactElement } from 'react';
import { DataTable, type Column } from '@/components/ui/data-table';
import { words } from '@/lib/kernel/words';
import { Instant } from './instant';
import { RetryButton } from './retry-button';

export type MailPart = 'waiting' | 'parked' | 'bounced';
type Mail = {
  readonly id: string;
  readonly kind: string;
  readonly address: string;
  readonly tries: number;
  readonly lastAnswer: string | null;
  readonly madeAt: Date;
};

type Props = {
  readonly part: MailPart;
  readonly mails: readonly Mail[];
  readonly keyOf: () => string;
  readonly retry: (form: FormData) => Promise<void>;
};

const COLUMNS: readonly Column[] = [
  { id: 'to', heading: words('stewards.outbox.to') },
  { id: 'about', heading: words('stewards.outbox.about') },
  { id: 'made', heading: words('stewards.outbox.made') },
  { id: 'tries', heading: words('stewards.outbox.tries'), numeric: true },
  { id: 'answer', heading: words('stewards.outbox.answer') },
];
const ACT: Column = { id: 'act', heading: words('stewards.outbox.act') };

/** Mail of one part of the outbox; what was given up can be tried again. */
export function MailTable({ part, mails, keyOf, retry }: Props): ReactElement {
  if (mails.length === 0) return <p>{words(`stewards.outbox.none.${part}`)}</p>;
  return (
    <DataTable
      id="mails"
      caption={words(`stewards.outbox.caption.${part}`)}
      columns={part === 'parked' ? [...COLUMNS, ACT] : COLUMNS}
      rows={mails.map(({ id, kind, address, tries, lastAnswer, madeAt }) => ({
        id,
        cells: {
          to: <span className="break-all">{address}</span>,
          about: kind,
          made: <Instant at={madeAt} />,
          tries,
          answer: <span className="break-words">{lastAnswer ?? words('stewards.outbox.noAnswer')}</span>,
          act: (
            <RetryButton what="mail" id={id} formKey={keyOf()} label={words('stewards.outbox.retryMail', { to: address })} act={retry} />
          ),
        },
      }))}
    />
  );
}
