import { deviceName } from '@/app/_server/device-name';
import { formInput } from '@/app/_server/form-input';
import { safePath } from '@/app/_server/safe-path';
import { canonicalJson } from '@/db/access/canonical-json';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

describe('a path to go on to', () => {
  it('stays on this server whatever it is', () => {
    fc.assert(
      fc.property(
        fc.oneof(fc.string(), fc.webUrl(), fc.constantFrom('//a', '/\\a', '/\ta')),
        (path) => {
          const url = new URL(safePath(path), 'http://desk.example');
          expect(url.host).toBe('desk.example');
        },
      ),
    );
    expect(safePath('/fits/new?scan=1#a')).toBe('/fits/new?scan=1#a');
    expect(safePath(['/a'])).toBe('/');
  });
});

describe('form fields', () => {
  it('become the object that a verb parses', () => {
    const data = new FormData();
    data.set('id', '1');
    data.set('meta.name', 'A');
    data.set('meta.notes', 'B');
    data.append('ids', 'x');
    data.append('ids', 'y');
    data.set('$ACTION_REF_1', '');
    expect(formInput(data)).toEqual({ id: '1', meta: { name: 'A', notes: 'B' }, ids: ['x', 'y'] });
  });

  it('cannot reach the prototype of objects', () => {
    const data = new FormData();
    data.set('__proto__.polluted', 'yes');
    data.set('constructor.prototype.polluted', 'yes');
    formInput(data);
    expect(({} as Record<string, unknown>).polluted).toBeUndefined();
  });
});

describe('canonical JSON', () => {
  it('is the same whatever the order of keys, and reads back as the same value', () => {
    fc.assert(
      fc.property(fc.jsonValue(), (value) => {
        expect(JSON.parse(canonicalJson(value))).toEqual(JSON.parse(JSON.stringify(value)));
      }),
    );
    expect(canonicalJson({ b: 1, a: [{ d: null, c: 0.1 }], e: undefined })).toBe(
      '{"a":[{"c":0.1,"d":null}],"b":1}',
    );
  });
});

describe('the name of a device', () => {
  it.each([
    [
      'Mozilla/5.0 (Windows NT 10.0; Win64; x64) Chrome/140.0 Safari/537.36 Edg/140.0',
      'Edge on Windows',
    ],
    [
      'Mozilla/5.0 (Macintosh; Intel Mac OS X 14_0) Version/17.0 Safari/605.1.15',
      'Safari on macOS',
    ],
    ['Mozilla/5.0 (X11; Linux x86_64) Chrome/140.0.0.0 Safari/537.36', 'Chrome on Linux'],
    ['Mozilla/5.0 (Linux; Android 14) Chrome/140.0 Mobile Safari/537.36', 'Chrome on Android'],
    ['', 'A browser'],
  ])('%s', (userAgent, name) => expect(deviceName(userAgent)).toBe(name));
});
