interface UrlPolicy {
  createScriptURL(url: string): string;
}
interface TrustedTypes {
  createPolicy(name: string, rules: UrlPolicy): UrlPolicy;
}

const { trustedTypes } = globalThis as { trustedTypes?: TrustedTypes };
/** Named in the server's Content-Security-Policy. Only addresses that the build wrote itself come by here. */
const policy = trustedTypes?.createPolicy('app#worker', { createScriptURL: (url) => url });

/** A worker under Trusted Types, which refuse a plain address as a script. */
export const TrustedWorker: typeof Worker = new Proxy(Worker, {
  construct: (target, [url, options]: [string | URL, WorkerOptions?]) =>
    new target(policy ? policy.createScriptURL(String(url)) : url, options),
});
