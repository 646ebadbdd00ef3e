declare module 'eslint-plugin-jsx-a11y' {
  import type { Linter } from 'eslint';
  const plugin: {
    flatConfigs: Record<
      'recommended' | 'strict',
      { plugins: Record<string, unknown>; rules: Linter.RulesRecord }
    >;
  };
  export default plugin;
}
