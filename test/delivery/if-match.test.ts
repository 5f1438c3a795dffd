import { describe, expect, test } from '@jest/globals';
import { etag, ifMatch } from '../../src/delivery/http/if-match.ts';
import type { AppRequest } from '../../src/delivery/http/request.types.ts';

const asked = (value?: string) => ({ headers: value === undefined ? {} : { 'if-match': value } }) as AppRequest;

describe('the version a change is based on', () => {
  test('comes back from its own tag', () => {
    expect(ifMatch(asked(etag(1)))).toBe(1);
    expect(ifMatch(asked('"v120"'))).toBe(120);
  });
  test.each([undefined, ''])('has to be named (%p)', (value) => {
    expect(() => ifMatch(asked(value))).toThrow(expect.objectContaining({ status: 428 }));
  });
  test.each(['*', 'v1', 'W/"v1"', '"v1", "v2"', '"v-1"', '"v1234567890"'])('%s is not one', (value) => {
    expect(() => ifMatch(asked(value))).toThrow(expect.objectContaining({ status: 400 }));
  });
});
