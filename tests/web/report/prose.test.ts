import { describe, expect, it } from 'vitest';
import { renderProse } from '../../../web/report/prose.tsx';

describe('renderProse', () => {
  it('shows markup as text', () => {
    const html = renderProse('<script>alert(1)</script> and <b onclick="x()">bold</b>');
    expect(html).not.toContain('<script');
    expect(html).not.toContain('<b ');
    expect(html).toContain('&lt;script&gt;');
  });

  it('loads nothing: no pictures, no script addresses', () => {
    expect(renderProse('![x](https://example.org/x.png)')).not.toContain('<img');
    expect(renderProse('[x](javascript:alert(1))')).not.toContain('href');
    expect(renderProse('[x](data:text/html,x)')).not.toContain('href');
  });

  it('sets formulas on the line and as paragraphs, with MathML', () => {
    expect(renderProse('with $f_1 = N / 60$ in Hz')).toMatch(/with <span class="katex">.*<math/s);
    const display = renderProse('so that\n\n$$L = \\frac{c}{2 f}$$\n\nholds');
    expect(display).toContain('an-display');
    expect(display).toContain('<p>holds</p>');
    expect(renderProse('so\n$$\nL = 1\n$$\nholds')).toContain('an-display');
  });

  it('leaves sums of money and lone signs alone', () => {
    expect(renderProse('from $5 to $6 each')).toBe('<p>from $5 to $6 each</p>\n');
    expect(renderProse('costs $ 5 $ only')).not.toContain('katex');
    expect(renderProse('$$ never closed')).not.toContain('katex');
  });

  it('does not take the signs of a formula for emphasis', () => {
    expect(renderProse('$a_1 * b_2 * c$')).not.toContain('<em>');
  });

  it('does not let a formula reach out of itself', () => {
    const html = renderProse(
      '$\\href{javascript:alert(1)}{x}$ $\\includegraphics{https://example.org/x.png}$ $\\htmlClass{y}{x}$',
    );
    expect(html).not.toMatch(/href="|<img|class="[^"]*\by\b/);
  });

  it('shows a faulty formula as it is written', () => {
    expect(renderProse('$\\frac{1}{$')).toContain('\\frac{1}{');
  });

  it('ranks headings below those of the report', () => {
    expect(renderProse('# Aside')).toBe('<h3>Aside</h3>\n');
  });
});
