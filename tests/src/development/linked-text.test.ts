import { describe, expect, it } from 'vitest';
import { linkedText } from '../../../src/features/development/linked-text.ts';

describe('the text of a message', () => {
  it('has its addresses as links, without the full stop that ends the sentence', () => {
    expect(linkedText('Open http://a.example/p/x_-1?b=2. Then write.')).toEqual([{ text: 'Open ' }, { text: 'http://a.example/p/x_-1?b=2', href: 'http://a.example/p/x_-1?b=2' }, { text: '. Then write.' }]);
  });

  it('makes no link of anything but http', () => {
    expect(linkedText('javascript:alert(1) mailto:a@b')).toEqual([{ text: 'javascript:alert(1) mailto:a@b' }]);
  });
});
