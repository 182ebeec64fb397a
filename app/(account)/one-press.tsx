import type { ReactElement } from 'react';
import { PageHeading } from '@/components/ui/page-heading';
import { SubmitButton } from '@/components/ui/submit-button';
import { words } from '@/lib/kernel/words';
import { freshForm } from '@/lib/server/define-action';

type Props = {
  readonly title: string;
  readonly lead: string;
  readonly submit: string;
  readonly token: string;
  readonly act: (form: FormData) => Promise<void>;
};

/** A mailed link is spent by a press, never by being opened: mail scanners open every link. */
export function OnePress({ title, lead, submit, token, act }: Props): ReactElement {
  return (
    <div className="max-w-text">
      <PageHeading>{title}</PageHeading>
      <p className="mt-4">{lead}</p>
      <form action={act} className="mt-6">
        <input type="hidden" name="key" value={freshForm().key} />
        <input type="hidden" name="token" value={token} />
        <SubmitButton busy={words('accounts.act.busy')}>{submit}</SubmitButton>
      </form>
    </div>
  );
}
