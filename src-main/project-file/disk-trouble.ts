const SENTENCES: Readonly<Record<string, string>> = {
  ENOENT: 'it is no longer there. Choose it again',
  EACCES: 'this account may not use it. Ask for access, or use another folder',
  EPERM: 'this account may not use it. Ask for access, or use another folder',
  EROFS: 'the disk can only be read. Use another folder',
  ENOSPC: 'the disk is full. Make room and try again',
  EDQUOT: 'the space allowed on this disk is used up. Make room and try again',
  EEXIST: 'a file of that name is in the way. Use another folder',
  EISDIR: 'it is a folder. Choose a file',
  ENOTDIR: 'a folder on the way to it is a file. Use another folder',
  EBUSY: 'another program holds it. Close that program and try again',
  EMFILE: 'too many files are open. Close other programs and try again',
  ENAMETOOLONG: 'its name is too long. Use a shorter one',
  EIO: 'the disk reported a fault. Copy your work to another disk',
};

/** What an error of the file system means for the user: "<what> could not be <done>: <why>. <What to do>." */
export function diskTrouble(what: string, done: string, error: unknown): string {
  const known = SENTENCES[codeOf(error) ?? ''];
  return `${what} could not be ${done}: ${known ?? (error instanceof Error ? error.message : String(error))}.`;
}

/** The system's name for an error, for example ENOENT; null for any other error. */
export function codeOf(error: unknown): string | null {
  return error instanceof Error && 'code' in error && typeof error.code === 'string' ? error.code : null;
}
