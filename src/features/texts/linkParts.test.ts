import { describe, expect, it } from 'vitest';
import { linkParts } from './linkParts.ts';

describe('linkParts', () => {
  it('finds addresses and leaves the punctuation behind them', () => {
    expect(linkParts('Live: http://127.0.0.1:4173/a/x-Y_9. Reply STOP')).toEqual([
      { words: 'Live: ', href: null },
      { words: 'http://127.0.0.1:4173/a/x-Y_9', href: 'http://127.0.0.1:4173/a/x-Y_9' },
      { words: '. Reply STOP', href: null },
    ]);
  });
  it('never makes a link of another scheme', () => {
    expect(linkParts('javascript:alert(1) ftp://x')).toEqual([
      { words: 'javascript:alert(1) ftp://x', href: null },
    ]);
  });
  it('knows an empty text', () => {
    expect(linkParts('')).toEqual([]);
  });
});
