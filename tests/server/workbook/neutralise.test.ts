import { describe, expect, it } from 'vitest';
import { neutralise } from '#server/workbook/neutralise';

describe('text on its way into a spreadsheet', () => {
  it.each(['=1+1', '+1+cmd', '-2+3', '@SUM(A1)', '\t=1', '\r\n=1', ' =1', '|x', '＝1', '\ufeff=1'])(
    'is made plain where it would be a formula: %j',
    (text) => {
      expect(neutralise(text)).toBe(`'${text}`);
    },
  );

  it.each(['Sand equivalent', '-2.5', '+0.3', '4.2 %', '', 'a=b', '3 @ 25 °C'])(
    'is left alone where it is harmless: %j',
    (text) => {
      expect(neutralise(text)).toBe(text);
    },
  );
});
