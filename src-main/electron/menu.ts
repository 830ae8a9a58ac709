import { Menu } from 'electron';
import type { MenuItemConstructorOptions } from 'electron';
import type { MenuCommand } from '../../shared-core/desk.ts';

/** The window's menu: what the page carries out goes to `send`, the rest is what the system itself does. */
export const buildMenu = (send: (command: MenuCommand) => void, onMac: boolean, unpacked: boolean): Menu => {
  const toPage = (label: string, command: MenuCommand, accelerator: string): MenuItemConstructorOptions => ({
    label,
    accelerator,
    click: () => {
      send(command);
    },
  });
  const line: MenuItemConstructorOptions = { type: 'separator' };
  const recent: MenuItemConstructorOptions = { role: 'recentDocuments', submenu: [{ role: 'clearRecentDocuments' }] };
  const about: MenuItemConstructorOptions = { label: 'Help', submenu: [{ role: 'about' }] };
  return Menu.buildFromTemplate([
    ...(onMac ? [{ role: 'appMenu' } as const] : []),
    {
      label: 'File',
      submenu: [
        toPage('New project', 'new', 'CmdOrCtrl+N'),
        toPage('Open…', 'open', 'CmdOrCtrl+O'),
        ...(onMac ? [recent] : []),
        line,
        toPage('Save', 'save', 'CmdOrCtrl+S'),
        line,
        onMac ? { role: 'close' } : { role: 'quit' },
      ],
    },
    {
      label: 'Edit',
      submenu: [
        toPage('Undo', 'undo', 'CmdOrCtrl+Z'),
        toPage('Redo', 'redo', onMac ? 'Shift+Cmd+Z' : 'Ctrl+Y'),
        line,
        { role: 'cut' },
        { role: 'copy' },
        { role: 'paste' },
        { role: 'selectAll' },
      ],
    },
    {
      label: 'View',
      submenu: [
        { role: 'resetZoom' },
        { role: 'zoomIn' },
        { role: 'zoomOut' },
        line,
        { role: 'togglefullscreen' },
        ...(unpacked ? [{ role: 'toggleDevTools' } as const] : []),
      ],
    },
    { role: 'windowMenu' },
    ...(onMac ? [] : [about]),
  ]);
};
