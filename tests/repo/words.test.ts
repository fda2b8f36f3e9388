import { execFileSync } from 'node:child_process';
import { readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { expect, test } from 'vitest';

const root = fileURLToPath(new URL('../..', import.meta.url));
const SELF = 'tests/repo/words.test.ts';
const files = execFileSync('git', ['ls-files', '-z', '--', '*.ts', '*.tsx', '*.mjs', '*.css', '*.sql', '*.md', '.ci'], {
  cwd: root,
  encoding: 'utf8',
})
  .split('\0')
  .filter((name) => name !== '' && name !== SELF);

const RULES = [
  { name: 'promises of later work', pattern: /\b(TODO|FIXME|XXX|HACK)\b/ },
  { name: 'lint that is switched off', pattern: /eslint-disable|@ts-ignore|@ts-nocheck|prettier-ignore/ },
  { name: 'tests that are skipped or that run alone', pattern: /\b(test|it|describe)\.(only|skip|todo|fixme)\b/ },
  { name: 'addresses of package registries', pattern: /https?:\/\/registry\./ },
  { name: 'paths of one machine', pattern: /['"`](\/home\/|\/root\/|\/tmp\/)/ },
];

test.each(RULES)('no file holds $name', ({ pattern }) => {
  const found = files.flatMap((name) =>
    read(name)
      .split('\n')
      .flatMap((line, index) => (pattern.test(line) ? [`${name}:${index + 1}`] : [])),
  );
  expect(found).toEqual([]);
});

test('the files are really read', () => {
  expect(files.length).toBeGreaterThan(50);
});

/** A file can be listed and gone when somebody is about to commit its removal. */
function read(name: string): string {
  try {
    return readFileSync(`${root}/${name}`, 'utf8');
  } catch {
    return '';
  }
}
