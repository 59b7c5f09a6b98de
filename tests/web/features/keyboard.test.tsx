import { cleanup, fireEvent, render, screen } from '@testing-library/react';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { useKeyboard, type KeyCommand } from '../../../web/features/revision/use-keyboard.ts';
import { walk } from '../../../web/features/revision/walk.ts';

afterEach(cleanup);

describe('walk', () => {
  const paths = ['inputs/a', 'inputs/b', 'sections/1/steps/c'];

  it('goes on and back, and stays at the ends', () => {
    expect(walk(paths, 'inputs/a', 1)).toBe('inputs/b');
    expect(walk(paths, 'inputs/b', -1)).toBe('inputs/a');
    expect(walk(paths, 'inputs/a', -1)).toBe('inputs/a');
    expect(walk(paths, 'sections/1/steps/c', 1)).toBe('sections/1/steps/c');
  });

  it('begins at the end that it comes from', () => {
    expect(walk(paths, undefined, 1)).toBe('inputs/a');
    expect(walk(paths, undefined, -1)).toBe('sections/1/steps/c');
    expect(walk(paths, 'gone', 1)).toBe('inputs/a');
    expect(walk([], undefined, 1)).toBeUndefined();
  });
});

function Page({ onCommand }: { readonly onCommand: (command: KeyCommand) => void }) {
  useKeyboard(onCommand);
  return <textarea aria-label="words" />;
}

describe('useKeyboard', () => {
  it('calls back for the keys of the table', () => {
    const onCommand = vi.fn();
    render(<Page onCommand={onCommand} />);
    for (const key of ['j', 'k', 'm', 'r', 't', '?', 'Escape', 'x']) fireEvent.keyDown(document.body, { key });
    expect(onCommand.mock.calls.flat()).toEqual(['next', 'previous', 'mark', 'remark', 'trace', 'keys', 'close']);
  });

  it('leaves typing, shortcuts of the browser and open dialogs alone', () => {
    const onCommand = vi.fn();
    render(<Page onCommand={onCommand} />);
    fireEvent.keyDown(screen.getByLabelText('words'), { key: 'm' });
    fireEvent.keyDown(document.body, { key: 'r', ctrlKey: true });
    const dialog = document.body.appendChild(document.createElement('dialog'));
    dialog.setAttribute('open', '');
    fireEvent.keyDown(document.body, { key: 'm' });
    dialog.remove();
    expect(onCommand).not.toHaveBeenCalled();
  });
});
