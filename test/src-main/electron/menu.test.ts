import type { MenuItemConstructorOptions } from 'electron';
import { describe, expect, it, vi } from 'vitest';
import { buildMenu } from '../../../src-main/electron/menu.ts';

const built = vi.hoisted(() => ({ templates: [] as MenuItemConstructorOptions[][] }));
vi.mock('electron', () => ({
  Menu: {
    buildFromTemplate: (template: MenuItemConstructorOptions[]) => {
      built.templates.push(template);
      return {};
    },
  },
}));

const itemsOf = (send: (command: string) => void, onMac: boolean, unpacked: boolean): MenuItemConstructorOptions[] => {
  buildMenu(send, onMac, unpacked);
  return (built.templates.at(-1) ?? []).flatMap((menu) => (Array.isArray(menu.submenu) ? menu.submenu : [menu]));
};

describe('the menu', () => {
  it('sends New, Open, Save, Undo and Redo to the page', () => {
    const send = vi.fn<(command: string) => void>();
    for (const item of itemsOf(send, false, false)) item.click?.({} as never, undefined, {});
    expect(send.mock.calls.map(([command]) => command)).toEqual(['new', 'open', 'save', 'undo', 'redo']);
  });

  it('leaves cutting, copying, pasting and quitting to the system', () => {
    const roles = itemsOf(vi.fn(), false, false).map((item) => item.role);
    expect(roles).toEqual(expect.arrayContaining(['cut', 'copy', 'paste', 'selectAll', 'quit', 'about']));
  });

  it('shows recent documents on a Mac and developer tools only in an unpacked program', () => {
    expect(itemsOf(vi.fn(), true, false).map((item) => item.role)).toContain('recentDocuments');
    expect(itemsOf(vi.fn(), false, false).map((item) => item.role)).not.toContain('toggleDevTools');
    expect(itemsOf(vi.fn(), false, true).map((item) => item.role)).toContain('toggleDevTools');
  });

  it('gives no two entries the same keys', () => {
    for (const onMac of [true, false]) {
      const keys = itemsOf(vi.fn(), onMac, true).flatMap((item) => item.accelerator ?? []);
      expect(new Set(keys).size).toBe(keys.length);
    }
  });
});
