import { describe, expect, it } from 'vitest';
import { html, linkAddresses } from './html.ts';

describe('markup', () => {
  it('escapes whatever is put in', () => {
    const words = '<img src=x onerror="alert(1)"> & \'';
    expect(html`<p title="${words}">${[html`<b>${words}</b>`]}</p>`.markup).toBe(
      '<p title="&#60;img src=x onerror=&#34;alert(1)&#34;&#62; &#38; &#39;"><b>&#60;img src=x onerror=&#34;alert(1)&#34;&#62; &#38; &#39;</b></p>',
    );
  });

  it('makes web addresses links, without the stop behind them', () => {
    expect(linkAddresses('See https://a.example/t/x?y=1&z=2. Or <b> http://b.example').markup).toBe(
      'See <a href="https://a.example/t/x?y=1&#38;z=2">https://a.example/t/x?y=1&#38;z=2</a>. Or &#60;b&#62; <a href="http://b.example">http://b.example</a>',
    );
    expect(linkAddresses('javascript:alert(1)').markup).toBe('javascript:alert(1)');
  });
});
