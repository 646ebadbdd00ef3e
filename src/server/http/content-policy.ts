/** Where pages may load from besides this site, by directive; known only at run time. */
export type PolicySources = Readonly<Record<string, readonly string[]>>;

/** The storage, whose public origin browsers send parts to and play from. */
export function storageSources(publicEndpoint: string): PolicySources {
  const { origin } = new URL(publicEndpoint);
  return { 'connect-src': [origin], 'img-src': [origin], 'media-src': [origin] };
}

/**
 * Adds sources to a Content-Security-Policy that the pages' build has made. A directive that is not there begins
 * with this site itself, as `default-src` would have let in.
 * @param policy the header as it stands
 */
export function amendPolicy(policy: string, sources: PolicySources): string {
  const directives = new Map(
    policy
      .split(';')
      .map((directive) => directive.trim())
      .filter((directive) => directive !== '')
      .map((directive) => {
        const [name = '', ...values] = directive.split(/\s+/);
        return [name, values] as const;
      }),
  );
  for (const [name, added] of Object.entries(sources)) {
    const there = directives.get(name) ?? ["'self'"];
    const kept = there.filter((source) => source !== "'none'");
    directives.set(name, [...new Set([...kept, ...added])]);
  }
  return [...directives].map(([name, values]) => [name, ...values].join(' ')).join('; ');
}
