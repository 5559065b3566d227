import { describe, expect, it } from 'vitest';
import { parseDecimal } from './parse-decimal';

describe('parseDecimal', () => {
  it.each([
    ['1.44', 1.44],
    ['1,44', 1.44],
    [' 174.5 ', 174.5],
    ['.5', 0.5],
    ['5.', 5],
    ['0', 0],
    ['-3', -3],
    ['\u22123.3', -3.3],
  ])('reads %j as %d', (text, value) => expect(parseDecimal(text)).toBe(value));

  it.each(['', '   '])('is null, never 0, for %j', (text) => expect(parseDecimal(text)).toBeNull());

  it.each(['1.2.3', '1,234.5', '12 cm', 'abc', '1e3', '--1', '.'])('is not a number for %j', (text) =>
    expect(parseDecimal(text)).toBeNaN(),
  );
});
