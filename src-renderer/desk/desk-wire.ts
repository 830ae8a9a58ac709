import type {
  Desk,
  DeskRequest,
  DeskRequests,
  FileHandle,
  GivenFile,
  MenuCommand,
  Reply,
} from '../../shared-core/desk.ts';

type MenuListener = (command: MenuCommand, given: GivenFile | null) => void;

/** The desk as the page reaches it, and the way a dropped or chosen file gets there. */
export interface DeskWire extends Desk {
  /** True where the host opens its own dialogs; elsewhere the page's file field serves. */
  readonly ownDialogs: boolean;
  receiveFile(file: File): Promise<Reply<FileHandle>>;
  onMenu(listener: MenuListener): void;
}

/** Set by the preload script of a desktop window; absent in a browser. */
interface WindowDesk {
  ask(request: string, ask: unknown): Promise<unknown>;
  receiveFile(file: File): Promise<string>;
  onMenu(listener: MenuListener): void;
}

declare global {
  interface Window {
    readonly normloomDesk?: WindowDesk;
  }
}

const LOST: Reply<never> = {
  ok: false,
  problem:
    'The program behind this page has ended. Start Normloom again. Changes to a project are kept as a draft; those to a class only where they were saved.',
};

export function connectDesk(): DeskWire {
  return window.normloomDesk === undefined ? browserWire() : windowWire(window.normloomDesk);
}

function windowWire(desk: WindowDesk): DeskWire {
  return {
    ownDialogs: true,
    async ask<R extends DeskRequest>(request: R, ask: DeskRequests[R]['ask']) {
      try {
        return (await desk.ask(request, ask)) as Reply<DeskRequests[R]['answer']>;
      } catch {
        return LOST;
      }
    },
    async receiveFile(file) {
      try {
        return { ok: true, value: await desk.receiveFile(file) };
      } catch {
        return { ok: false, problem: 'This file could not be taken. Choose it with Open instead of dropping it.' };
      }
    },
    onMenu: (listener) => {
      desk.onMenu(listener);
    },
  };
}

function browserWire(): DeskWire {
  return {
    ownDialogs: false,
    async ask<R extends DeskRequest>(request: R, ask: DeskRequests[R]['ask']) {
      return (await post('/desk', 'application/json', JSON.stringify({ request, ask }))) as Reply<
        DeskRequests[R]['answer']
      >;
    },
    async receiveFile(file) {
      const answer = (await post(
        `/upload?name=${encodeURIComponent(file.name)}`,
        'application/octet-stream',
        file,
      )) as Reply<{ readonly handle: FileHandle }>;
      return answer.ok ? { ok: true, value: answer.value.handle } : answer;
    },
    onMenu: () => undefined,
  };
}

async function post(url: string, type: string, body: BodyInit): Promise<unknown> {
  try {
    const response = await fetch(url, { method: 'POST', headers: { 'content-type': type }, body });
    return await response.json();
  } catch {
    return LOST;
  }
}
