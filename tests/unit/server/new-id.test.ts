import { expect, test } from 'vitest';
import { newId } from '@/lib/server/new-id';

const NOW = new Date('2026-12-01T10:00:00.123Z');

test('SRV-16 an id is a UUIDv7 of its instant', () => {
  const id = newId(NOW);
  expect(id).toMatch(/^[0-9a-f]{8}-[0-9a-f]{4}-7[0-9a-f]{3}-[89ab][0-9a-f]{3}-[0-9a-f]{12}$/);
  expect(parseInt(id.replaceAll('-', '').slice(0, 12), 16)).toBe(NOW.getTime());
});

test('SRV-16 ids of one instant differ, and ids of later instants lie behind', () => {
  const ids = Array.from({ length: 5000 }, () => newId(NOW));
  expect(new Set(ids).size).toBe(5000);
  const later = newId(new Date(NOW.getTime() + 1));
  expect(ids.every((id) => id < later)).toBe(true);
});
