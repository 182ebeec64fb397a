import type { Metadata } from 'next';
import type { ReactElement } from 'react';
import { EntryForm } from '@/components/accounts/entry-form';
import { PageHeading } from '@/components/ui/page-heading';
import { readMailedLink } from '@/lib/accounts/read-mailed-link';
import { words } from '@/lib/kernel/words';
import { makeCtx } from '@/lib/server/ctx';
import { freshForm } from '@/lib/server/define-action';
import { choosePassword } from '../../actions';
import { formWords } from '../../form-words';
import { LinkOver } from '../../link-over';

type Props = { readonly params: Promise<{ readonly token: string }> };

export const metadata: Metadata = { title: words('accounts.reset.choose.title'), robots: { index: false } };

export default async function ChoosePasswordPage({ params }: Props): Promise<ReactElement> {
  const { token } = await params;
  if ((await readMailedLink(makeCtx(), token, ['reset'])) === null) return <LinkOver />;
  return (
    <div className="max-w-text">
      <PageHeading>{words('accounts.reset.choose.title')}</PageHeading>
      <p className="mt-4 mb-6">{words('accounts.reset.choose.lead')}</p>
      <EntryForm
        action={choosePassword}
        first={freshForm()}
        {...formWords()}
        hidden={{ token }}
        submit={words('accounts.reset.choose.submit')}
        fields={[
          {
            name: 'password',
            type: 'password',
            label: words('accounts.field.newPassword'),
            hint: words('accounts.field.newPasswordHint'),
            autoComplete: 'new-password',
          },
        ]}
      />
    </div>
  );
}
