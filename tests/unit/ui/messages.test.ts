import { readdirSync } from 'node:fs';
import { parse, TYPE, type MessageFormatElement } from '@formatjs/icu-messageformat-parser';
import { createTranslator } from 'use-intl/core';
import { describe, expect, test } from 'vitest';
import { LOCALE, MESSAGES } from '@/lib/kernel/words';

const FOLDER = new URL('../../../content/messages/en/', import.meta.url);

type Message = readonly [key: string, text: string];

function messagesIn(value: unknown, path: readonly string[] = []): readonly Message[] {
  if (typeof value === 'string') return [[path.join('.'), value]];
  if (typeof value !== 'object' || value === null) throw new Error(`${path.join('.')} is no text`);
  return Object.entries(value).flatMap(([key, inner]) => messagesIn(inner, [...path, key]));
}

type Arguments = Record<string, unknown>;

/** Arguments for one way through a message: of each choice the option at `turn`, or its last. */
function argumentsFor(elements: readonly MessageFormatElement[], turn: number, found: Arguments = {}): Arguments {
  for (const element of elements) {
    if (element.type === TYPE.tag) {
      found[element.value] = (inner: string) => inner;
      argumentsFor(element.children, turn, found);
    } else if (element.type === TYPE.select || element.type === TYPE.plural) {
      const options = Object.keys(element.options);
      const option = options[Math.min(turn, options.length - 1)] ?? 'other';
      found[element.value] ??= element.type === TYPE.select ? option : countFor(option);
      for (const one of Object.values(element.options)) argumentsFor(one.value, turn, found);
    } else if (element.type === TYPE.date || element.type === TYPE.time) found[element.value] ??= new Date('2026-12-01T00:00:00Z');
    else if (element.type === TYPE.number) found[element.value] ??= 3;
    else if (element.type === TYPE.argument) found[element.value] ??= 'Denmark';
  }
  return found;
}

const countFor = (option: string): number => {
  if (option.startsWith('=')) return Number(option.slice(1));
  return option === 'one' ? 1 : 6;
};

const failOn =
  (key: string) =>
  (error: Error): never => {
    throw new Error(key, { cause: error });
  };

const ALL = messagesIn(MESSAGES);

test('every message file is part of the words', () => {
  const files = readdirSync(FOLDER).map((file) => file.replace('.json', ''));
  expect(Object.keys(MESSAGES).sort()).toEqual(files.sort());
});

test('there are messages to format', () => {
  expect(ALL.length).toBeGreaterThan(50);
});

describe('every message can be formatted, whichever way its choices go', () => {
  test.each(Object.keys(MESSAGES))('%s', (file) => {
    for (const [key, text] of ALL.filter(([key]) => key.startsWith(`${file}.`))) {
      const say = createTranslator({ locale: LOCALE, messages: { text }, timeZone: 'UTC', onError: failOn(key) });
      for (let turn = 0; turn < 6; turn += 1) expect(say.markup('text', argumentsFor(parse(text), turn) as never), key).not.toBe('');
    }
  });

  test('none has a space at its ends or two in a row', () => {
    for (const [key, text] of ALL) expect(text.trim().replaceAll('  ', ' '), key).toBe(text);
  });

  test('none uses a sign that the fonts lack', () => {
    for (const [key, text] of ALL) expect(text, key).not.toMatch(/[≤≥→←⇒]/u);
  });
});
