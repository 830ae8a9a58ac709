import type { IpcMainInvokeEvent, Session, WebContents } from 'electron';
import { isOwnAddress } from './scheme.ts';

/** Schemes that never leave the machine: what the page makes itself, and the developer tools of an unpacked program. */
const LOCAL_SCHEMES: ReadonlySet<string> = new Set(['blob:', 'data:', 'devtools:']);

const staysHere = (address: string): boolean =>
  isOwnAddress(address) || (URL.canParse(address) && LOCAL_SCHEMES.has(new URL(address).protocol));

/** No permission, no download, no spelling dictionary to fetch, and no request but to the own scheme. */
export const closeSession = (session: Session): void => {
  session.setPermissionRequestHandler((_contents, _permission, answer) => {
    answer(false);
  });
  session.setPermissionCheckHandler(() => false);
  session.setDevicePermissionHandler(() => false);
  session.setSpellCheckerEnabled(false);
  session.webRequest.onBeforeRequest((details, answer) => {
    answer({ cancel: !staysHere(details.url) });
  });
  session.on('will-download', (event) => {
    event.preventDefault();
  });
};

/** The page stays where it is: no navigation, no redirect, no second window, no embedded page. */
export const holdPage = (contents: WebContents): void => {
  contents.setWindowOpenHandler(() => ({ action: 'deny' }));
  contents.on('will-navigate', (event) => {
    event.preventDefault();
  });
  contents.on('will-frame-navigate', (event) => {
    event.preventDefault();
  });
  contents.on('will-redirect', (event) => {
    event.preventDefault();
  });
  contents.on('will-attach-webview', (event) => {
    event.preventDefault();
  });
};

/** True when a message was sent by the program's own page itself: not by a frame in it, not by any other address. */
export const isOwnPage = (event: Pick<IpcMainInvokeEvent, 'sender' | 'senderFrame'>): boolean => {
  const frame = event.senderFrame;
  return frame !== null && frame === event.sender.mainFrame && frame.parent === null && isOwnAddress(frame.url);
};
