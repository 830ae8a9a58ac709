import type { FileHandle, GivenFile, MenuCommand } from '../../shared-core/desk.ts';

/** The one channel on which the page asks and the desk answers. */
export const DESK_CHANNEL = 'desk';

/** The channel on which the window's menu and files opened from outside reach the page. */
export const MENU_CHANNEL = 'menu';

/** What crosses the desk channel, from the preload script to the main process. */
export type DeskMessage =
  | { readonly kind: 'ask'; readonly request: string; readonly ask: unknown }
  | { readonly kind: 'file'; readonly path: string };

/** What the page finds as `window.normloomDesk`. */
export interface WindowDesk {
  ask(request: string, ask: unknown): Promise<unknown>;
  /** Handle of a file that the user dropped on the page; rejects with a sentence when it is not a file of this machine. */
  receiveFile(file: File): Promise<FileHandle>;
  onMenu(listener: (command: MenuCommand, given: GivenFile | null) => void): void;
}
