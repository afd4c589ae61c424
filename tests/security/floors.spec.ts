import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';

// S13: no installed version lies below the floors of the design; several copies count each.
const floors: Readonly<Record<string, string>> = {
  '@angular/core': '21.2.19',
  '@angular/common': '21.2.19',
  '@angular/compiler': '21.2.19',
  '@angular/forms': '21.2.19',
  '@angular/localize': '21.2.19',
  '@angular/platform-browser': '21.2.19',
  '@angular/router': '21.2.19',
  '@angular/service-worker': '21.2.19',
  dompurify: '3.4.11',
  'drizzle-orm': '0.45.2',
  multer: '2.2.0',
  nodemailer: '9.1.1',
  sharp: '0.35.0',
  'path-to-regexp': '8.4.0',
  'body-parser': '2.2.1',
  qs: '6.16.0',
  jsonwebtoken: '9.0.0',
};
/** Named by the floors, but not used yet; taken from this list with the feature that brings them. */
const notYet = ['multer', 'nodemailer', 'sharp'];

const { packages } = JSON.parse(readFileSync('package-lock.json', 'utf8')) as {
  packages: Record<string, { version: string; dev?: boolean }>;
};
/** What is shipped; tools of the developer's machine serve nobody. */
const versionsOf = (name: string) =>
  Object.entries(packages)
    .filter(([path, { dev }]) => !dev && path.endsWith(`node_modules/${name}`))
    .map(([, { version }]) => version);

const isAtLeast = (version: string, floor: string): boolean => {
  const [a, b] = [version, floor].map((text) => text.split('-', 1)[0]!.split('.').map(Number));
  for (const [index, part] of b!.entries()) {
    const have = a![index] ?? 0;
    if (have !== part) return have > part;
  }
  return true;
};

describe.each(Object.entries(floors))('%s', (name, floor) => {
  it(`is at least ${floor}`, () => {
    const versions = versionsOf(name);
    expect(versions.length > 0).toBe(!notYet.includes(name));
    expect(versions.filter((version) => !isAtLeast(version, floor))).toEqual([]);
  });
});
