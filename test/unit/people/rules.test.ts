import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  firstScreen,
  normaliseEmail,
  passwordFault,
  rolesBlockers,
  safePath,
  signInSentence,
  waitAfter,
} from '@/services/people/rules';
import { minutes } from '@/services/time';

describe('an address', () => {
  it('is kept in one form, whatever case and blanks it was typed with', () => {
    expect(normaliseEmail('  Edda.Holm@Hollin-Road.Example ')).toBe('edda.holm@hollin-road.example');
    expect(normaliseEmail('ruth+kits@pellstow.school.example')).toBe('ruth+kits@pellstow.school.example');
  });

  it.each([
    ['two signs', 'edda@veck.example@holm.example'],
    ['a full-width sign that folds into a second one', 'edda@veck.example＠holm.example'],
    ['a small sign that folds into a second one', 'edda﹫veck.example@holm.example'],
    ['a list', 'edda@veck.example,ruth@holm.example'],
    ['a group', 'all: edda@veck.example;'],
    ['quotes', '"edda@holm.example"@veck.example'],
    ['a comment', 'edda(home)@veck.example'],
    ['angle brackets', 'Edda <edda@veck.example>'],
    ['a line break and a header', 'edda@veck.example\r\nBcc: ruth@holm.example'],
    ['a lone carriage return', 'edda\r@veck.example'],
    ['a blank inside', 'ed da@veck.example'],
    ['a zero byte', 'edda\u0000@veck.example'],
    ['a hidden joiner', 'ed\u200Dda@veck.example'],
    ['letters of another script that look alike', 'еdda@veck.example'],
    ['a host of another script', 'edda@vеck.example'],
    ['no host', 'edda@'],
    ['no name', '@veck.example'],
    ['a host without a dot', 'edda@localhost'],
    ['a number for a host', 'edda@127.0.0.1'],
    ['a literal host', 'edda@[127.0.0.1]'],
    ['a label with a hyphen at its end', 'edda@veck-.example'],
    ['a dot at the start', '.edda@veck.example'],
    ['two dots in a row', 'ed..da@veck.example'],
    ['a host that ends in a dot', 'edda@veck.example.'],
    ['a name that is too long', `${'e'.repeat(65)}@veck.example`],
    ['a host that is too long', `edda@${'a.'.repeat(130)}example`],
    ['a backslash', 'edda\\@veck.example'],
    ['a percent route', 'edda%holm.example@@veck.example'],
  ])('with %s is refused', (_what, text) => {
    expect(normaliseEmail(text)).toBeNull();
  });

  it('that is taken holds one sign, plain characters and stays as it is when read again', () => {
    fc.assert(
      fc.property(fc.oneof(fc.emailAddress(), fc.string({ unit: 'binary' })), (text) => {
        const address = normaliseEmail(text);
        if (address === null) return;
        expect(address).toMatch(/^[\x21-\x3f\x5b-\x7e]+@[a-z0-9.-]+$/);
        expect(normaliseEmail(address)).toBe(address);
      }),
      { numRuns: 2000 },
    );
  });
});

describe('a new password', () => {
  it.each([
    ['staff', 'osk-4-light'],
    ['customer', 'quay horse lantern'],
    ['customer', '漏斗と小さな猫と大きな木の家'],
    ['customer', '  spaces at both ends  '],
    ['customer', 'a'.repeat(60) + 'bcd' + 'z'.repeat(65)],
  ] as const)('of %s may be %s', (kind, password) => {
    expect(passwordFault(password, kind)).toBeNull();
  });

  it.each([
    ['staff', 'osk4567'],
    ['customer', 'nine char'],
    ['customer', 'password12'],
    ['customer', 'Coilyard2026'],
    ['customer', 'qwertyqwer'],
    ['customer', '1234567890'],
    ['customer', '0987654321'],
    ['customer', 'abcdefghijkl'],
    ['customer', 'aaaaaaaaaaaa'],
    ['customer', 'ababababab'],
    ['staff', 'checker1'],
    ['staff', 'letmein99'],
    ['customer', 'x'.repeat(100) + 'abc' + 'y'.repeat(26)],
  ] as const)('of %s may not be %s', (kind, password) => {
    expect(passwordFault(password, kind)).not.toBeNull();
  });

  it('may not be little more than the name of the person', () => {
    expect(passwordFault('Isolde2026', 'customer', ['Isolde', 'Hark'])).toMatch(/isolde/);
    expect(passwordFault('isolde and her nine lanterns', 'customer', ['Isolde', 'Hark'])).toBeNull();
  });

  it('that is short says by how much', () => {
    expect(passwordFault('six123', 'customer')).toMatch(/Short by 4/);
  });
});

it('waiting begins with the third failure, doubles, and never exceeds a quarter of an hour', () => {
  expect([0, 1, 2, 3, 4, 5, 6].map(waitAfter)).toEqual([0, 0, 0, 1000, 2000, 4000, 8000]);
  expect(waitAfter(13)).toBe(minutes(15));
  expect(waitAfter(1_000_000)).toBe(minutes(15));
});

describe('the page to go to after signing in', () => {
  it.each(['/orders', '/kits/4-g?band=mw#box', '/bench/abc', '/'])('may be %s', (path) => {
    expect(safePath(path)).toBe(path);
  });

  it.each([
    '//evil.example',
    '///evil.example',
    '/\\evil.example',
    '\\/evil.example',
    '/\t/evil.example',
    '/\n/evil.example',
    '/%2f/evil.example',
    '/%2Fevil.example',
    '/%5cevil.example',
    '/%09/evil.example',
    '/..//evil.example',
    '/a/..//evil.example',
    'https://evil.example',
    'http:evil.example',
    'javascript:alert(1)',
    'data:text/html,x',
    '@evil.example',
    'evil.example',
    ' /orders',
    '/orders ',
    '/\u0000',
    '',
    '/ö',
    `/${'a'.repeat(2001)}`,
    'http://[::1]/',
    '//2130706433/',
    '?next=/x',
    '#x',
    '.',
    '..',
  ])('may not be %j', (path) => {
    expect(safePath(path)).toBeNull();
  });

  it('never leaves the yard, whatever text is asked for', () => {
    fc.assert(
      fc.property(fc.oneof(fc.webUrl(), fc.string({ unit: 'binary' }), fc.webPath()), (text) => {
        const path = safePath(text);
        if (path !== null) expect(new URL(path, 'https://yard.example').origin).toBe('https://yard.example');
      }),
      { numRuns: 2000 },
    );
  });
});

it('everybody starts where their work waits', () => {
  expect(firstScreen({ kind: 'staff', roles: ['designer'] })).toBe('/bench');
  expect(firstScreen({ kind: 'staff', roles: ['designer', 'checker'] })).toBe('/check');
  expect(firstScreen({ kind: 'staff', roles: ['packer'] })).toBe('/packing');
  expect(firstScreen({ kind: 'staff', roles: ['designer', 'owner'] })).toBe('/desk');
  expect(firstScreen({ kind: 'customer', roles: [] })).toBe('/orders');
});

it('the yard keeps an owner, and nobody drops that role by mistake', () => {
  const change = { isSelf: false, before: ['owner'], after: ['packer'], ownersLeft: 1 } as const;
  expect(rolesBlockers(change)).toEqual([]);
  expect(rolesBlockers({ ...change, ownersLeft: 0 })).toHaveLength(1);
  expect(rolesBlockers({ ...change, isSelf: true })).toHaveLength(1);
  expect(rolesBlockers({ ...change, isSelf: true, after: ['owner', 'packer'] })).toEqual([]);
});

it('the sign-in page has a sentence for every answer, and shows no text that came in the address', () => {
  expect(signInSentence('wait-4')).toMatch(/Wait 4 seconds/);
  expect(signInSentence('wait-900')).toMatch(/Wait 15 minutes/);
  expect(signInSentence('wait-<b>')).not.toMatch(/</);
  expect(signInSentence('call this number')).not.toMatch(/call/);
});
