import { keyCommand } from './key-command';

describe('keyCommand', () => {
  const press = (key: string, init: KeyboardEventInit = {}, target: EventTarget = document.body) => {
    const event = new KeyboardEvent('keydown', { key, ...init });
    Object.defineProperty(event, 'target', { value: target });
    return keyCommand(event);
  };

  it('undoes and redoes by the usual keys', () => {
    expect(press('z', { ctrlKey: true })).toBe('undo');
    expect(press('z', { metaKey: true })).toBe('undo');
    expect(press('Z', { ctrlKey: true, shiftKey: true })).toBe('redo');
    expect(press('y', { ctrlKey: true })).toBe('redo');
    expect(press('z')).toBeNull();
    expect(press('z', { ctrlKey: true, altKey: true })).toBeNull();
  });

  it('leaves text that is being typed to the browser', () => {
    const input = document.createElement('input');
    expect(press('z', { ctrlKey: true }, input)).toBe('undo');
    input.dataset['typed'] = '';
    expect(press('z', { ctrlKey: true }, input)).toBeNull();
    expect(press('z', { ctrlKey: true }, document.createElement('textarea'))).toBeNull();
  });

  it('shows the keys for a question mark outside of text', () => {
    expect(press('?')).toBe('shortcuts');
    expect(press('?', {}, document.createElement('input'))).toBeNull();
    expect(press('?', {}, document.createElement('button'))).toBe('shortcuts');
  });
});
