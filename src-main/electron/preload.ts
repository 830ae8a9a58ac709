import { contextBridge, ipcRenderer, webUtils } from 'electron';
import type { GivenFile, MenuCommand, Reply } from '../../shared-core/desk.ts';
import { DESK_CHANNEL, MENU_CHANNEL } from './bridge.ts';
import type { DeskMessage, WindowDesk } from './bridge.ts';

const send = (message: DeskMessage): Promise<unknown> => ipcRenderer.invoke(DESK_CHANNEL, message);

const windowDesk: WindowDesk = {
  ask: (request, ask) => send({ kind: 'ask', request, ask }),
  async receiveFile(file) {
    const path = webUtils.getPathForFile(file);
    if (path === '') throw new Error('This is not a file on this machine. Save it first, then drop the saved file.');
    const reply = (await send({ kind: 'file', path })) as Reply<string>;
    if (!reply.ok) throw new Error(reply.problem);
    return reply.value;
  },
  onMenu(listener) {
    ipcRenderer.on(MENU_CHANNEL, (_event, command: MenuCommand, given: GivenFile | null) => {
      listener(command, given);
    });
  },
};

contextBridge.exposeInMainWorld('normloomDesk', windowDesk);
