import { err, ok, type Result } from '@/lib/kernel/result';

export type NoteFile = { readonly fields: Readonly<Record<string, string>>; readonly body: string };

const FILE = /^---\n([\s\S]*?)\n---\n([\s\S]*)$/;
const FIELD = /^([a-zA-Z]+):[ \t]*(.*)$/;

/**
 * A note's file as its fields and its body. Front matter is one field a line, "name: value", between two lines of hyphens.
 * Refused, in words, where a line is no field or a field stands twice.
 */
export function readFrontMatter(text: string): Result<NoteFile, string> {
  const parts = FILE.exec(text.replaceAll('\r\n', '\n'));
  if (parts === null) return err('the file does not begin with front matter between two lines of "---"');
  const [, head = '', body = ''] = parts;
  const fields = fieldsOf(head);
  return fields.ok ? ok({ fields: Object.fromEntries(fields.value), body }) : fields;
}

function fieldsOf(head: string): Result<ReadonlyMap<string, string>, string> {
  const fields = new Map<string, string>();
  for (const line of head.split('\n')) {
    const [, name, value = ''] = FIELD.exec(line) ?? [];
    if (name === undefined) return err(`"${line}" is no field of the front matter`);
    if (fields.has(name)) return err(`the field "${name}" stands twice`);
    fields.set(name, value.trim());
  }
  return ok(fields);
}
