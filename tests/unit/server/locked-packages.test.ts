import { readFileSync } from 'node:fs';
import { expect, test } from 'vitest';
import { z } from 'zod';

const locked = z.object({
  version: z.string().optional(),
  resolved: z.string().optional(),
  integrity: z.string().optional(),
  inBundle: z.boolean().optional(),
  link: z.boolean().optional(),
});
const lock = z
  .object({ lockfileVersion: z.literal(3), packages: z.record(z.string(), locked) })
  .parse(JSON.parse(readFileSync('package-lock.json', 'utf8')));
const floors = z.record(z.string(), z.string()).parse(JSON.parse(readFileSync('.ci/floors.json', 'utf8')));
const packages = Object.entries(lock.packages).filter(([place]) => place !== '');

const numbersOf = (version: string): readonly number[] => version.split('-')[0]?.split('.').map(Number) ?? [];

function isAtLeast(version: string, floor: string): boolean {
  const [have, need] = [numbersOf(version), numbersOf(floor)];
  const differing = need.findIndex((part, place) => part !== have[place]);
  return differing === -1 || (have[differing] ?? 0) > (need[differing] ?? 0);
}

/** Every place in the tree at which a package is installed. */
const placesOf = (name: string) =>
  packages.filter(([place]) => place === `node_modules/${name}` || place.endsWith(`/node_modules/${name}`));

test('SRV-19 S53 each locked package comes from the registry and has its integrity written down', () => {
  const faults = packages.filter(([, { resolved, integrity, inBundle, link }]) => {
    const fromRegistry = resolved === undefined || resolved.startsWith('https://registry.npmjs.org/');
    const isWhole = integrity?.startsWith('sha512-') === true || inBundle === true;
    return link === true || !fromRegistry || !isWhole;
  });
  expect(faults.map(([place]) => place)).toEqual([]);
});

test('SRV-19 S53 every package we name is named in one version', () => {
  const about = z
    .object({ dependencies: z.record(z.string(), z.string()), devDependencies: z.record(z.string(), z.string()) })
    .parse(JSON.parse(readFileSync('package.json', 'utf8')));
  for (const [name, version] of Object.entries({ ...about.dependencies, ...about.devDependencies })) {
    expect(version, name).toMatch(/^\d+\.\d+\.\d+(-[\w.]+)?$/);
    expect(lock.packages[`node_modules/${name}`]?.version, name).toBe(version);
  }
});

test('SRV-19 S01 what has a security floor stands at or above it, wherever it lies in the tree', () => {
  for (const [name, floor] of Object.entries(floors)) {
    expect(placesOf(name).length, name).toBeGreaterThan(0);
    for (const [place, { version = '0' }] of placesOf(name))
      expect(isAtLeast(version, floor), `${place} ${version} >= ${floor}`).toBe(true);
  }
});

test('SRV-19 versions are compared part by part, as numbers', () => {
  expect([isAtLeast('16.4.6', '16.2.6'), isAtLeast('7.0.7', '7.0.7'), isAtLeast('10.0.0', '9.9.9')]).toEqual([true, true, true]);
  expect([isAtLeast('16.2.5', '16.2.6'), isAtLeast('7.0.6', '7.0.7'), isAtLeast('9.9.9', '10.0.0')]).toEqual([false, false, false]);
});
