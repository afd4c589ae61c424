interface PolicyFactory {
  createPolicy(name: string, rules: { createScriptURL: (url: string) => string }): unknown;
}

/**
 * Workers and the service worker are Trusted Types sinks that Angular does not wrap. The default policy
 * lets scripts of our own origin through and throws on any other.
 */
export function allowOwnScripts(): void {
  const { trustedTypes } = window as unknown as { trustedTypes?: PolicyFactory };
  trustedTypes?.createPolicy('default', {
    createScriptURL: (url) => {
      if (new URL(url, document.baseURI).origin !== location.origin) {
        throw new TypeError('A script of another origin was refused.');
      }
      return url;
    },
  });
}
