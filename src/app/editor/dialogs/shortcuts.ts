/** One thing that keys do. */
export interface Shortcut {
  readonly keys: readonly string[];
  readonly does: string;
}

export interface ShortcutGroup {
  readonly where: string;
  readonly shortcuts: readonly Shortcut[];
}

/** @param isApple Command instead of Control */
export function shortcutGroups(isApple: boolean): readonly ShortcutGroup[] {
  const control = isApple ? '⌘' : 'Ctrl';
  const alt = isApple ? '⌥' : 'Alt';
  return [
    {
      where: 'Everywhere',
      shortcuts: [
        { keys: [control, 'Z'], does: 'Undo' },
        { keys: ['Shift', control, 'Z'], does: 'Redo' },
        { keys: ['?'], does: 'This overview' },
      ],
    },
    {
      where: 'Journey',
      shortcuts: [
        { keys: ['←', '→'], does: 'Go along the steps' },
        { keys: [alt, '←', '→'], does: 'Move the step' },
        { keys: ['Insert'], does: 'Add a step after this one' },
        { keys: ['Delete'], does: 'Remove the step' },
      ],
    },
    {
      where: 'Layers',
      shortcuts: [
        { keys: ['↑', '↓'], does: 'Go from layer to layer' },
        { keys: ['Shift', '↑', '↓'], does: 'Select a run of layers' },
        { keys: ['Space'], does: 'Add this layer to the selection, or take it out' },
        { keys: [control, 'A'], does: 'Select all' },
        { keys: [alt, '↑', '↓'], does: 'Move the selected layers' },
        { keys: ['Enter'], does: 'Change the steel or the thickness' },
        { keys: ['Insert'], does: 'Lay a layer like this one on top of it' },
        { keys: ['Delete'], does: 'Remove the selected layers' },
      ],
    },
    {
      where: 'Fields for figures',
      shortcuts: [
        { keys: ['↑', '↓'], does: 'One mark of the rule up or down' },
        { keys: ['Shift', '↑', '↓'], does: 'Ten times as far' },
        { keys: ['Esc'], does: 'Take back what was typed' },
      ],
    },
  ];
}
