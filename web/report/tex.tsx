import katex from 'katex';
import { memo } from 'react';

const OPTIONS = {
  output: 'htmlAndMathml',
  throwOnError: false,
  trust: false,
  strict: 'ignore',
  maxExpand: 200,
  maxSize: 20,
} as const;

/** HTML and MathML of a formula. A faulty formula shows its own text in the colour of a failure, and never throws. */
export function renderTex(tex: string, display = false): string {
  return katex.renderToString(tex, { ...OPTIONS, displayMode: display, errorColor: 'var(--an-madder)' });
}

interface TexProps {
  readonly tex: string;
  readonly className?: string;
}

/** A formula on the line. Memoised: setting a formula costs more than anything else that a report does. */
export const Tex = memo(function Tex({ tex, className }: TexProps) {
  return (
    <span
      className={className === undefined ? 'an-tex' : `an-tex ${className}`}
      dangerouslySetInnerHTML={{ __html: renderTex(tex) }}
    />
  );
});
