import { isAbsolute, join, relative, resolve } from 'node:path';

/**
 * The file of the page that a request path names, as an absolute path inside `folder`; null for a path that leads out of
 * it or that no browser would send. `/` is the page itself. Nothing is read here.
 */
export const pageFile = (folder: string, requestPath: string): string | null => {
  let path: string;
  try {
    path = decodeURIComponent(requestPath);
  } catch {
    return null;
  }
  if (!path.startsWith('/') || path.includes('\\') || path.includes('\0')) return null;
  if (path.split('/').includes('..')) return null;
  const file = resolve(join(folder, path === '/' ? 'index.html' : path));
  const inside = relative(folder, file);
  return inside === '' || inside.startsWith('..') || isAbsolute(inside) ? null : file;
};
