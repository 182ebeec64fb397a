import type { ReactElement } from 'react';
import { words } from '@/lib/kernel/words';

export const THEMES = ['light', 'dark', 'system'] as const;
export type Theme = (typeof THEMES)[number];

export const isTheme = (value: unknown): value is Theme => THEMES.some((theme) => theme === value);

type Props = { readonly theme: Theme; readonly choose: (form: FormData) => Promise<void> };

/** Three buttons that each do what they say, so that nothing changes by merely choosing. */
export function ThemeChoice({ theme, choose }: Props): ReactElement {
  return (
    <form action={choose}>
      <fieldset className="theme-choice">
        <legend className="mb-1">{words('site.theme.label')}</legend>
        {THEMES.map((value) => (
          <button key={value} type="submit" name="theme" value={value} aria-pressed={value === theme}>
            {words(`site.theme.${value}`)}
          </button>
        ))}
      </fieldset>
    </form>
  );
}
