/** A text or an address that is put into a mail after its Markdown was read. */
export type MailValue = { readonly text: string; readonly isLink: boolean };

/** Puts each value in the place of its mark, as `say` writes it. */
export type Restore = (text: string, say: (value: MailValue) => string) => string;

/** A mail whose values still stand as marks. */
export type MailParts = { readonly body: string; readonly footer: string };

const paragraphsOf = (body: string): readonly string[] =>
  body.split(/\n{2,}/).map((paragraph) => paragraph.replace(/\s*\n\s*/g, ' ').trim());
const isList = (paragraph: string): boolean => /^- /.test(paragraph);

/** The plain text: what most of the mail is made for. A paragraph is one line, so that readers' programs wrap it to their width. */
export function mailPlain({ body, footer }: MailParts, restore: Restore): string {
  const plain = body.replaceAll('**', '');
  const text = [...paragraphsOf(plain), `-- \n${footer}`].join('\n\n');
  return `${restore(text, ({ text: value, isLink }) => (isLink ? value : wellSpaced(value)))}\n`;
}

/** The same as simple HTML: paragraphs, bold words and links, no pictures, no styles from elsewhere, nothing that tells on the reader. */
export function mailHtml({ body, footer }: MailParts, restore: Restore, title: string): string {
  const paragraphs = paragraphsOf(body).map((paragraph) =>
    isList(paragraph) ? `<ul><li>${inline(paragraph.slice(2))}</li></ul>` : `<p>${inline(paragraph)}</p>`,
  );
  const foot = `<hr><p><small>${inline(footer).replaceAll('\n', '<br>')}</small></p>`;
  const page =
    `<!doctype html><html lang="en"><head><meta charset="utf-8"><title>${escape(title)}</title></head>` +
    `<body style="max-width:36rem;font:1rem/1.5 Georgia,serif">${paragraphs.join('\n')}\n${foot}</body></html>\n`;
  return restore(page, ({ text, isLink }) =>
    isLink ? `<a href="${escape(text)}">${escape(text)}</a>` : escape(wellSpaced(text)).replaceAll('\n', '<br>'),
  );
}

const inline = (text: string): string => escape(text).replace(/\*\*(.+?)\*\*/g, '<strong>$1</strong>');

/** Lines and tabs a person wrote stay; other control characters and marks that turn the direction of reading do not. */
const wellSpaced = (text: string): string =>
  text
    .replace(/\r\n?/g, '\n')
    .replace(/[^\P{Cc}\n\t]|[\u200e\u200f\u202a-\u202e\u2066-\u2069]/gu, '')
    .replace(/\n{3,}/g, '\n\n');

const ESCAPES: Readonly<Record<string, string>> = { '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;', "'": '&#39;' };
const escape = (text: string): string => text.replace(/[&<>"']/g, (character) => ESCAPES[character] ?? character);
