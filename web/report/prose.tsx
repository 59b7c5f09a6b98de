import createMarkdown, { type StateBlock, type StateInline } from 'markdown-it';
import { memo } from 'react';
import { renderTex } from './tex.tsx';

/** `$…$` on the line: no blank just inside the signs, and no digit after the second, so that `$5 and $6` stays text. */
const INLINE_MATH = /\$(?![\s$])((?:\\.|[^\\$\n])*?[^\s\\$])\$(?!\d)/y;
/** `$$…$$` as a paragraph of its own, on one line or several. */
const DISPLAY_MATH = /^\$\$([\s\S]+?)\$\$$/;

const markdown = createMarkdown({ html: false, linkify: false, typographer: false });
// A report loads nothing from elsewhere: it must read the same without a network, and tell nobody that it is read.
markdown.disable('image');
markdown.inline.ruler.before('escape', 'math', inlineMath);
markdown.block.ruler.before('fence', 'math', displayMath, { alt: ['paragraph'] });
markdown.renderer.rules['math'] = (tokens, index) => renderTex(tokens[index]?.content ?? '');
markdown.renderer.rules['math_display'] = (tokens, index) =>
  `<div class="an-display">${renderTex(tokens[index]?.content ?? '', true)}</div>`;
// The report has its own title and section headings: a heading in prose ranks below them.
markdown.core.ruler.push('demote', ({ tokens }) => {
  for (const token of tokens) {
    const rank = /^h([1-6])$/.exec(token.tag)?.[1];
    if (rank !== undefined) token.tag = `h${Math.min(6, Number(rank) + 2)}`;
  }
});
markdown.core.ruler.push('links', ({ tokens }) => {
  for (const child of tokens.flatMap((token) => token.children ?? [])) {
    if (child.type === 'link_open') child.attrSet('rel', 'noopener noreferrer');
  }
});

function inlineMath(state: StateInline, silent: boolean): boolean {
  INLINE_MATH.lastIndex = state.pos;
  const match = INLINE_MATH.exec(state.src);
  if (match === null) return false;
  if (!silent) state.push('math', 'math', 0).content = match[1] ?? '';
  state.pos += match[0].length;
  return true;
}

function displayMath(state: StateBlock, startLine: number, endLine: number, silent: boolean): boolean {
  if (!lineText(state, startLine).startsWith('$$')) return false;
  let text = '';
  for (let line = startLine; line < endLine && !state.isEmpty(line); line++) {
    text += `${text === '' ? '' : '\n'}${lineText(state, line)}`;
    const match = DISPLAY_MATH.exec(text);
    if (match === null) continue;
    if (silent) return true;
    const token = state.push('math_display', 'math', 0);
    token.block = true;
    token.content = (match[1] ?? '').trim();
    token.map = [startLine, line + 1];
    state.line = line + 1;
    return true;
  }
  return false;
}

function lineText(state: StateBlock, line: number): string {
  return state.src.slice((state.bMarks[line] ?? 0) + (state.tShift[line] ?? 0), state.eMarks[line] ?? 0).trimEnd();
}

/** HTML of prose in Markdown. Markup in it is shown as text; only Markdown and formulas are set. */
export function renderProse(text: string): string {
  return markdown.render(text);
}

export const Prose = memo(function Prose({ text }: { readonly text: string }) {
  return <div className="an-prose" dangerouslySetInnerHTML={{ __html: renderProse(text) }} />;
});
