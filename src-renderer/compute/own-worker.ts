/** Lets only scripts of the program's own origin become workers, as the page's policy demands. */
interface WorkerPolicy {
  createScriptURL(url: string): string;
}

interface PolicyMaker {
  createPolicy(name: string, rules: WorkerPolicy): WorkerPolicy;
}

function ownScript(url: string): string {
  const resolved = new URL(url, window.location.href);
  if (resolved.origin !== window.location.origin) throw new TypeError('a worker of another origin');
  return resolved.href;
}

let policy: WorkerPolicy | null = null;

/** Starts a module worker from a built script of the program. */
export function startWorker(url: string): Worker {
  const maker = (window as unknown as { readonly trustedTypes?: PolicyMaker }).trustedTypes;
  policy ??= maker?.createPolicy('normloom-worker', { createScriptURL: ownScript }) ?? { createScriptURL: ownScript };
  return new Worker(policy.createScriptURL(url), { type: 'module' });
}
