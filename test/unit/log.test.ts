import { expect, test } from 'vitest';
import { loggedError } from '@/services/log';
import { withoutSecrets } from '@/instrumentation';

test('a line of the log says what broke and where', () => {
  const line = loggedError(Object.assign(new TypeError('x is not a function'), { code: 'E_X' }));
  expect(line).toMatchObject({ name: 'TypeError', message: 'x is not a function', cause: 'E_X' });
  expect(line).toHaveProperty('at.0', expect.stringContaining('log.test'));
});

test('and holds no value of a row and no address', () => {
  const statement =
    "insert into `people` (`email`) values ('ann@home.example', 'a - b') - UNIQUE constraint failed: people.email";
  expect(loggedError(new Error(statement))).toMatchObject({ message: 'UNIQUE constraint failed: people.email' });
  expect(loggedError(new Error('550 <ann@home.example> unknown'))).toMatchObject({
    message: '550 <(address)> unknown',
  });
  expect(JSON.stringify(loggedError(new Error(statement)))).not.toMatch(/ann@|a - b/);
});

test('and no secret of a link', () => {
  expect(withoutSecrets(`/invitations/${'a'.repeat(43)}?key=${'b'.repeat(43)}`)).toBe('/invitations/(secret)');
  expect(withoutSecrets('/orders/0123456789abcdefghjkmnpqrs')).toBe('/orders/0123456789abcdefghjkmnpqrs');
});
