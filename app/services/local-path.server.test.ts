import { expect, test } from 'vitest';
import { localPath } from './local-path.server';

test.each(['/coaches', '/rounds/1?x=2#y', '/a//b', '/'])('%s leads on', (path) => {
  expect(localPath(path, '/else')).toBe(path);
});

test.each([
  ['nothing', null],
  ['an empty text', ''],
  ['a whole address', 'https://elsewhere.example/'],
  ['an address without a scheme', '//elsewhere.example/'],
  ['a stroke that browsers turn round', '/\\elsewhere.example'],
  ['a tab that browsers leave out', '/\t/elsewhere.example'],
  ['a line end that browsers leave out', '/\n/elsewhere.example'],
  ['steps up that uncover a host', '/..//elsewhere.example'],
  ['a dot that uncovers a host', '/.//elsewhere.example'],
  ['a script', 'javascript:alert(1)'],
  ['a relative path', 'coaches'],
])('%s does not', (_, path) => {
  expect(localPath(path, '/else')).toBe('/else');
});
